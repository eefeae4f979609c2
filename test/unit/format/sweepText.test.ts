import { expect, it } from 'vitest';
import { sweepSentence } from '../../../src/format/sweepText.ts';
import { planSweep } from '../../../workers/selection/planSweep.ts';
import { rankSweep } from '../../../workers/selection/rankSweep.ts';
import { sweepFits } from '../../../workers/selection/sweepFits.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { SweepRange } from '../../../workers/contract/selection.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

it('says what came first, how clearly, and what became of the rest', () => {
  const range: SweepRange = { p: [0, 2], q: [0, 2], P: [0, 0], Q: [0, 0], d: [0], D: [0], s: 0, levels: ['mean'] };
  const like = candidateOf({ order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 } });
  const fits: Fit[] = [];
  sweepFits(
    {
      values: publishedSeries('lakeHuron'),
      candidates: planSweep(range, like, 1).parts[0]!,
      mode: 'all',
      range,
      seed: 1,
    },
    (news) => fits.push(...news.fits),
  );
  const sentence = sweepSentence({ fits, size: 9, failed: 0, passedOver: 1, mode: 'all' }, rankSweep(fits));
  // Lake Huron: AICc 214.92 for ARMA(1,1) with mean, 215.70 for AR(2) (34-digit computation): within 2 of each other.
  expect(sentence).toContain('(1,0,1), with mean comes first');
  expect(sentence).toContain('within 2: the record does not settle which');
  expect(sentence).toContain('1 passed over as hopeless');
  expect(sweepSentence({ fits: [], size: 3, failed: 3, passedOver: 0, mode: 'all' }, rankSweep([]))).toContain(
    'No candidate',
  );
});
