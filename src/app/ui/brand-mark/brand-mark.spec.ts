import { TestBed } from '@angular/core/testing';
import { BrandMark } from './brand-mark';

describe('BrandMark', () => {
  async function draw(label: string): Promise<SVGElement | null> {
    const fixture = TestBed.createComponent(BrandMark);
    fixture.componentRef.setInput('label', label);
    await fixture.whenStable();
    return (fixture.nativeElement as HTMLElement).querySelector('svg');
  }

  it('is decoration without a label', async () => {
    expect((await draw(''))?.getAttribute('aria-hidden')).toBe('true');
  });

  it('says its label', async () => {
    const svg = await draw('Heddle');
    expect(svg?.getAttribute('role')).toBe('img');
    expect(svg?.getAttribute('aria-label')).toBe('Heddle');
  });
});
