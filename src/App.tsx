import { useEffect, useState } from 'react';
import { ArrivalSheet } from './panels/arrival/ArrivalSheet.tsx';
import { CandidateTable } from './panels/candidates/CandidateTable.tsx';
import { DossierBar } from './panels/dossier/DossierBar.tsx';
import { Detail } from './panels/evidence/Detail.tsx';
import { Evidence } from './panels/evidence/Evidence.tsx';
import { SizeAndShape } from './panels/evidence/SizeAndShape.tsx';
import { Notices } from './panels/notices/Notices.tsx';
import { PredictStation } from './panels/predict/PredictStation.tsx';
import { EmptySheet } from './panels/record/EmptySheet.tsx';
import { Masthead } from './panels/record/Masthead.tsx';
import { RecordPanel } from './panels/record/RecordPanel.tsx';
import { ShapePanel } from './panels/shape/ShapePanel.tsx';
import { SweepPanel } from './panels/sweep/SweepPanel.tsx';
import { activeRecord } from './state/selectors.ts';
import { useActions, useAppState } from './state/useApp.ts';

/** The page: one sheet that takes a drop anywhere. */
export function App() {
  const actions = useActions();
  const record = useAppState(activeRecord);
  const arrival = useAppState((state) => state.arrival);
  const opening = useAppState((state) => state.opening);
  const [over, setOver] = useState(false);

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const target = event.target as HTMLElement;
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z' || target.matches('textarea')) return;
      event.preventDefault();
      if (event.shiftKey) actions.redo();
      else actions.undo();
    };
    addEventListener('keydown', onKey);
    return () => removeEventListener('keydown', onKey);
  }, [actions]);

  // The whole window takes a drop: beside the sheet the browser would leave the page for the file.
  useEffect(() => {
    const enter = (event: DragEvent) => {
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent) => {
      event.preventDefault();
      setOver(false);
      const files = [...(event.dataTransfer?.files ?? [])];
      const text = event.dataTransfer?.getData('text/plain') ?? '';
      if (files.length > 0) void actions.openFiles(files);
      else if (text !== '') void actions.openText(text, 'dropped text');
    };
    addEventListener('dragover', enter);
    addEventListener('dragleave', leave);
    addEventListener('drop', drop);
    return () => {
      removeEventListener('dragover', enter);
      removeEventListener('dragleave', leave);
      removeEventListener('drop', drop);
    };
  }, [actions]);

  return (
    <div className={over ? 'page taking' : 'page'}>
      <a className="skip" href="#candidates">
        To the candidates
      </a>
      <Masthead />
      <Notices />
      {arrival !== null && <ArrivalSheet arrival={arrival} />}
      <main>
        {record === null ? (
          <EmptySheet opening={opening} />
        ) : (
          <>
            <RecordPanel record={record} />
            <ShapePanel record={record} />
            <div className="bench">
              <div className="left">
                <CandidateTable record={record} />
                <SweepPanel record={record} />
                <SizeAndShape record={record} />
              </div>
              <Evidence record={record} />
            </div>
            <Detail record={record} />
            <PredictStation record={record} />
            <DossierBar />
          </>
        )}
      </main>
      {over && <p className="takes">Let go: the record is read, nothing is computed yet.</p>}
    </div>
  );
}
