import { useEffect, useState } from 'react';
import type { Order, Transform } from '../../../workers/contract/candidate.ts';
import type { Failure } from '../../../workers/contract/failures.ts';
import type { Shape } from '../../../workers/contract/shape.ts';
import type { RecordState } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';

export interface ShapeLook {
  readonly order: Pick<Order, 'd' | 'D' | 's'>;
  readonly transform: Transform;
}

export interface ShapeState {
  /** The last answer, also while a newer one is on its way. */
  readonly shape: Shape | null;
  readonly failure: Failure | null;
  readonly busy: boolean;
  readonly again: () => void;
}

interface Answer {
  readonly key: string;
  readonly record: string;
  readonly shape: Shape | null;
  readonly failure: Failure | null;
}

/** The shape of the record as it is looked at (`look` must be a stable object); a late answer to an older question is dropped. */
export function useShape(record: RecordState, look: ShapeLook): ShapeState {
  const actions = useActions();
  const [answer, setAnswer] = useState<Answer | null>(null);
  const [round, setRound] = useState(0);
  const loaded = record.source.kind === 'loaded';
  const own = `${record.id} ${record.seriesHash} ${record.window.from} ${record.window.to}`;
  const key = `${own} ${JSON.stringify(look)} ${round}`;

  useEffect(() => {
    if (!loaded) return undefined;
    let late = false;
    // A moment's wait, so that typing a season asks once.
    const timer = setTimeout(() => {
      void actions.describeShape(look.order, look.transform).then((result) => {
        if (late) return;
        setAnswer((before) => ({
          key,
          record: own,
          shape: result.ok ? result.value : before?.record === own ? before.shape : null,
          failure: result.ok ? null : result.failure,
        }));
      });
    }, 120);
    return () => {
      late = true;
      clearTimeout(timer);
    };
  }, [actions, look, key, own, loaded]);

  const mine = answer?.record === own ? answer : null;
  return {
    shape: mine?.shape ?? null,
    failure: answer?.key === key ? answer.failure : null,
    busy: loaded && answer?.key !== key,
    again: () => setRound((before) => before + 1),
  };
}
