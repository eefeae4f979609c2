import type { Axis } from '../../../workers/contract/series.ts';
import type { AdviceReason, Shape, Sureness } from '../../../workers/contract/shape.ts';
import { candidateName } from '../../format/notation.ts';
import { aboutNames, reasonSentence, surenessWord } from '../../format/shapeText.ts';

/** The advice question by question: what, why, and how sure. */
export function Advice({ shape, axis }: { readonly shape: Shape; readonly axis: Axis }) {
  const { advice } = shape;
  const sureness: Readonly<Record<string, Sureness>> = {
    Season: advice.sureness.season,
    Differencing: advice.sureness.d,
    Transform: advice.sureness.transform,
    Orders: advice.sureness.orders,
  };
  const groups = new Map<string, AdviceReason[]>();
  for (const reason of advice.reasons) {
    const name = aboutNames[reason.about];
    groups.set(name, [...(groups.get(name) ?? []), reason]);
  }
  return (
    <div className="look-advice">
      <h3>Advice, question by question</h3>
      <dl>
        {[...groups].map(([name, reasons]) => (
          <div key={name}>
            <dt>
              {name}
              {sureness[name] !== undefined && <span className="sureness">{surenessWord(sureness[name])}</span>}
            </dt>
            <dd>
              {reasons.map((reason) => (
                <p key={reason.code + JSON.stringify(reason.numbers)}>{reasonSentence(reason, axis)}</p>
              ))}
            </dd>
          </div>
        ))}
      </dl>
      <p className="quiet">
        To try first: {advice.candidates.map((candidate) => candidateName(candidate)).join(' · ')}. First guesses; the
        fits decide.
      </p>
    </div>
  );
}
