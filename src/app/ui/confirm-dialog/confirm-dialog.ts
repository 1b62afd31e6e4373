import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialog, MatDialogModule } from '@angular/material/dialog';
import { map, Observable } from 'rxjs';

/** What a person reads before something is sent or cannot be taken back. */
export interface Confirmation {
  readonly title: string;
  readonly text: string;
  /** Names of those affected, one line each; shown in full, scrolling if long. */
  readonly affected?: readonly string[];
  /** Heads the list: "These 3 mentors are asked:". */
  readonly affectedLabel?: string;
  /** The deed, as a verb: "Send 42 proposals". */
  readonly confirm: string;
  readonly cancel?: string;
  /** Madder instead of indigo, for what removes or ends something. */
  readonly tone?: 'act' | 'remove';
}

@Component({
  selector: 'app-confirm-dialog',
  imports: [MatButton, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './confirm-dialog.html',
  styleUrl: './confirm-dialog.scss',
})
export class ConfirmDialog {
  protected readonly data = inject<Confirmation>(MAT_DIALOG_DATA);
}

/** Asks, and emits once whether the person went ahead; closing the dialog is a no. */
export function confirmWith(dialog: MatDialog, confirmation: Confirmation): Observable<boolean> {
  return dialog
    .open<ConfirmDialog, Confirmation, boolean>(ConfirmDialog, {
      data: confirmation,
      maxWidth: '520px',
      width: 'calc(100vw - 32px)',
      autoFocus: 'first-heading',
    })
    .afterClosed()
    .pipe(map((answer) => answer === true));
}
