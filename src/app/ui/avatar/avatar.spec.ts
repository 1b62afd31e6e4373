import { TestBed } from '@angular/core/testing';
import { Avatar, initialsOf } from './avatar';

describe('initialsOf', () => {
  it.each([
    ['Ines Varga', 'IV'],
    ['Nguyễn Thị Minh', 'NM'],
    ['đặng an', 'ĐA'],
    ['Zoë', 'Z'],
    ["O'Brien", 'O'],
    ['(Bo) Stone', 'BS'],
    ['  ', ''],
  ])('shortens %s to %s', (name, initials) => {
    expect(initialsOf(name)).toBe(initials);
  });
});

describe('Avatar', () => {
  it('shows the photo instead of initials', async () => {
    const fixture = TestBed.createComponent(Avatar);
    fixture.componentRef.setInput('name', 'Ines Varga');
    fixture.componentRef.setInput('side', 'mentee');
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.textContent?.trim()).toBe('IV');
    expect(host.classList).toContain('mentee');

    fixture.componentRef.setInput('photoUrl', '/photo.webp');
    await fixture.whenStable();
    expect(host.querySelector('img')?.getAttribute('src')).toBe('/photo.webp');
  });
});
