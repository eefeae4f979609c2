import type { SweepReport, SweepRequest } from '../contract/selection.ts';
import { sweepFits } from '../selection/sweepFits.ts';

/** Fits reported at a time: each report is a message to the page. */
const AT_ONCE = 8;

/** Runs a part of a sweep, its reports gathered into fewer messages. */
export function sweepInSteps(request: SweepRequest, report: ((news: SweepReport) => void) | undefined): void {
  let gathered: SweepReport = { fits: [], failed: 0, passedOver: 0 };
  const send = () => {
    report?.(gathered);
    gathered = { fits: [], failed: 0, passedOver: 0 };
  };
  sweepFits(request, ({ fits, failed, passedOver }) => {
    gathered = {
      fits: [...gathered.fits, ...fits],
      failed: gathered.failed + failed,
      passedOver: gathered.passedOver + passedOver,
    };
    if (gathered.fits.length >= AT_ONCE) send();
  });
  send();
}
