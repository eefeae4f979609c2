/** The unfilled sheet: each space says what question it will answer. */
export function EmptySheet({ opening }: { readonly opening: boolean }) {
  return (
    <div className="empty-sheet" id="candidates" aria-busy={opening}>
      <section className="record-space">
        <h2>Record</h2>
        <p className="question">What did the plant log, at what interval, and where is nothing known?</p>
        <p>Drop a CSV anywhere on this sheet, open or paste one, or take an example.</p>
      </section>
      <section>
        <h2>Candidates</h2>
        <p className="question">Which noise models are under consideration, and which of them may be compared?</p>
      </section>
      <section>
        <h2>Verdict</h2>
        <p className="question">May the chosen model be defended, and on what evidence?</p>
      </section>
      <section>
        <h2>Put to work</h2>
        <p className="question">What will the next readings be, and how sure is that?</p>
      </section>
      <section>
        <h2>Dossier</h2>
        <p className="question">What do I sign, send and find again in six months?</p>
      </section>
    </div>
  );
}
