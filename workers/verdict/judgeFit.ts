import type { DiagnoseRequest, Judgement, Verdict } from '../contract/diagnostics.ts';
import type { Result } from '../contract/result.ts';
import { diagnoseFit } from '../diagnostics/diagnoseFit.ts';
import { comparabilityKey } from '../selection/comparabilityKey.ts';
import { rules } from './rules.ts';

/**
 * The evidence on one fit and the verdict drawn from it.
 *
 * @param request as `diagnoseFit`
 * @returns standing is the worst of its sentences: unsound, doubtful, otherwise sound; failures as `diagnoseFit`
 */
export function judgeFit(request: DiagnoseRequest): Result<Judgement> {
  const diagnosed = diagnoseFit(request);
  if (!diagnosed.ok) return diagnosed;
  const evidence = diagnosed.value;
  const items = rules(evidence);
  const worst = items.some(({ weight }) => weight === 'unsound') ? 'unsound' : 'doubtful';
  const standing: Verdict['standing'] = items.every(({ weight }) => weight === 'supports') ? 'sound' : worst;
  return { ok: true, value: { evidence, verdict: { standing, items }, comparability: comparabilityKey(request.fit) } };
}
