import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import type { Step } from '../../../../procedures/document';
import type { RunCommand } from '../../../../procedures/engine/showing';
import { HandSetting } from '../../core/hand-setting';
import { Theme } from '../../core/theme';
import { RunGear } from '../run-gear';
import { RunPreferences } from '../run-preferences';
import { RunStore } from '../run-store';
import type { RunView } from '../run-view';
import { AwakeScreen } from '../wake-lock';
import { GearSheet } from './gear-sheet';
import type { LaidSheet } from './laid-sheet';
import { LimitTakeover } from './limit-takeover';
import { LookBackSheet } from './look-back-sheet';
import { OpenListSheet } from './open-list-sheet';
import { ResumeCard } from './resume-card';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';
import { StopSheet } from './stop-sheet';
import { TakeAgainSheet } from './take-again-sheet';
import { ViewSheet } from './view-sheet';
import { WayOutSheet } from './way-out-sheet';
import { WhySheet } from './why-sheet';

/** What lies over the step by the run's own state. */
export type Takeover = 'limit' | 'stopped' | 'resume' | 'elsewhere';

/** Every card that may lie over a step. Apart from the page, so that the first step need not wait for them. */
@Component({
  selector: 'bay-run-sheets',
  imports: [
    GearSheet,
    LimitTakeover,
    LookBackSheet,
    OpenListSheet,
    ResumeCard,
    SheetBody,
    SheetHand,
    StopSheet,
    TakeAgainSheet,
    ViewSheet,
    WayOutSheet,
    WhySheet,
  ],
  templateUrl: './run-sheets.html',
  styles: ':host { display: contents }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunSheets {
  protected readonly store = inject(RunStore);
  protected readonly gear = inject(RunGear);
  protected readonly preferences = inject(RunPreferences);
  protected readonly holding = inject(HandSetting);
  protected readonly theme = inject(Theme);
  protected readonly awake = inject(AwakeScreen);

  readonly run = input.required<RunView>();
  readonly step = input.required<Step | undefined>();
  readonly takeover = input.required<Takeover | undefined>();
  readonly sheet = input.required<LaidSheet | undefined>();
  /** The device's clock. */
  readonly now = input.required<number>();
  /** Where sending stands, in words. */
  readonly connection = input.required<string>();

  readonly commanded = output<RunCommand>();
  /** A step is to be done again. */
  readonly repeated = output<string>();
  /** A step whose reading no longer holds is to be done again. */
  readonly takenAgain = output<string>();
  readonly opened = output<LaidSheet>();
  readonly left = output();
  readonly leftForBench = output();
}
