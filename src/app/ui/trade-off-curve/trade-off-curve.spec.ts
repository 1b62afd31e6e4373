import { TestBed } from '@angular/core/testing';
import { TradeOffCurve } from './trade-off-curve';

describe('TradeOffCurve', () => {
  async function draw(points: readonly { paired: number; meanFit: number }[], current: number | null) {
    const fixture = TestBed.createComponent(TradeOffCurve);
    fixture.componentRef.setInput('points', points);
    fixture.componentRef.setInput('current', current);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  it('marks the current plan', async () => {
    const host = await draw(
      [
        { paired: 144, meanFit: 7300 },
        { paired: 145, meanFit: 7140 },
      ],
      145,
    );
    expect(host.querySelector('.here')?.textContent).toContain('this plan: 145, mean 71.4');
    expect(host.querySelectorAll('tbody tr')).toHaveLength(2);
  });

  it.each([0, 1])('draws %i points without broken numbers', async (count) => {
    const host = await draw([{ paired: 3, meanFit: 5000 }].slice(0, count), null);
    expect(host.innerHTML).not.toMatch(/NaN|Infinity/);
  });
});
