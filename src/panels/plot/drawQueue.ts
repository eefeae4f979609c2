type Task = () => Promise<void>;

let chain: Promise<void> = Promise.resolve();

/** Runs drawings one after the other, each in a task of its own, so that none delays a click by more than itself. */
export function enqueueDrawing(task: Task): void {
  chain = chain
    .then(() => new Promise<void>((resolve) => setTimeout(resolve, 0)))
    .then(task)
    .catch(() => undefined);
}
