import { TestBed } from '@angular/core/testing';
import { MatDialog } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';
import { confirmWith } from './confirm-dialog';

describe('confirmWith', () => {
  async function ask(choose: string): Promise<boolean> {
    const answer = firstValueFrom(
      confirmWith(TestBed.inject(MatDialog), {
        title: 'Send 2 proposals',
        text: 'Each gets a message.',
        affected: ['Ines Varga', 'Ravi Menon'],
        confirm: 'Send 2 proposals',
      }),
    );
    await new Promise((resolve) => setTimeout(resolve));
    const buttons = [...document.querySelectorAll<HTMLButtonElement>('mat-dialog-container button')];
    buttons.find((button) => button.textContent?.includes(choose))?.click();
    return answer;
  }

  it('shows who is affected and tells the choice', async () => {
    const answer = ask('Send 2 proposals');
    await new Promise((resolve) => setTimeout(resolve));
    expect(await answer).toBe(true);
  });

  it('takes closing for a no', async () => {
    expect(await ask('Cancel')).toBe(false);
  });
});
