import type { Inspection, RecordState } from '../../state/appState.ts';
import { reportSentence } from '../../format/findingText.ts';
import { counted } from '../../format/numbers.ts';
import { useAppState } from '../../state/useApp.ts';
import { HandRepairs } from './HandRepairs.tsx';
import { LoggerReport } from './LoggerReport.tsx';
import { RepairList } from './RepairList.tsx';

interface ForensicsPanelProps {
  readonly record: RecordState;
  readonly ends: readonly [string, string];
  readonly onEnds: (ends: readonly [string, string]) => void;
  readonly marking: boolean;
  readonly onMarking: (marking: boolean) => void;
}

/** What the logger did to the record, and what was done about it: one line under the record that opens. */
export function ForensicsPanel({ record, ...marks }: ForensicsPanelProps) {
  const forensics = useAppState((state) => state.forensics);
  if (record.source.kind !== 'loaded') return null;
  const { record: now, raw } = record.source;
  const inspection = forensics?.seriesHash === now.series.hash ? forensics : null;
  return (
    <details className="forensics">
      <summary>
        <strong>What the logger did</strong>: {shortly(inspection)} · {repairsShortly(record.repairs.length)}
      </summary>
      <div className="forensics-body">
        <section aria-labelledby="logger-report">
          <h3 id="logger-report">Found in the readings{record.repairs.length > 0 ? ' as they stand now' : ''}</h3>
          <LoggerReport inspection={inspection} series={now.series} />
        </section>
        <section aria-labelledby="repair-list">
          <h3 id="repair-list">Repairs</h3>
          <RepairList repairs={record.repairs} axis={raw.series.axis} />
          <h3>By hand</h3>
          <HandRepairs series={now.series} {...marks} />
        </section>
      </div>
    </details>
  );
}

function shortly(inspection: Inspection | null): string {
  if (inspection === null) return 'being looked at';
  return inspection.answer.ok ? reportSentence(inspection.answer.value) : 'could not be looked at';
}

function repairsShortly(count: number): string {
  return count === 0 ? 'no repairs' : counted(count, 'repair');
}
