import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { CycleRibbon, RibbonStation } from './cycle-ribbon';

const stations: RibbonStation[] = [
  { key: 'applications', label: 'Applications', link: '/a', count: '239 in', note: 'closed 12 Oct', state: 'done' },
  { key: 'plan', label: 'Runs & plan', link: '/b', state: 'now' },
  { key: 'pairs', label: 'Pairs', link: null, state: 'ahead' },
];

describe('CycleRibbon', () => {
  async function draw(): Promise<HTMLElement> {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(CycleRibbon);
    fixture.componentRef.setInput('stations', stations);
    fixture.componentRef.setInput('here', 'plan');
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  it('links the stations that can be opened and marks the open one', async () => {
    const host = await draw();
    const links = [...host.querySelectorAll('a')];
    expect(links.map((link) => link.textContent?.trim())).toEqual(['Applications', 'Runs & plan']);
    expect(links.map((link) => link.getAttribute('aria-current'))).toEqual([null, 'page']);
  });

  it('says each state in words', async () => {
    const host = await draw();
    const states = [...host.querySelectorAll('.visually-hidden')].map((each) => each.textContent?.trim());
    expect(states).toEqual(['done', 'under way', 'ahead']);
  });
});
