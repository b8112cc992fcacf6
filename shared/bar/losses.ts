/** The causes of lost metal. Every gram that goes is put down to one of them. */
export const LOSS_CAUSES = ['scale', 'kerf', 'grinding', 'cutting', 'trim'] as const;
export type LossCause = (typeof LOSS_CAUSES)[number];

/** Something for each cause of loss: volumes in mm³ or masses in kg, as the holder says. */
export type Losses = { readonly [cause in LossCause]: number };

export const NO_LOSSES: Losses = { scale: 0, kerf: 0, grinding: 0, cutting: 0, trim: 0 };

/** Sum by cause. */
export function addLosses(a: Losses, b: Losses): Losses {
  return mapLosses(a, (amount, cause) => amount + b[cause]);
}

/** A new value for each cause. */
export function mapLosses(losses: Losses, change: (amount: number, cause: LossCause) => number): Losses {
  return {
    scale: change(losses.scale, 'scale'),
    kerf: change(losses.kerf, 'kerf'),
    grinding: change(losses.grinding, 'grinding'),
    cutting: change(losses.cutting, 'cutting'),
    trim: change(losses.trim, 'trim'),
  };
}

/** Everything lost, whatever the cause. */
export function totalLoss(losses: Losses): number {
  return LOSS_CAUSES.reduce((sum, cause) => sum + losses[cause], 0);
}
