/** A row and a letter in the field of the chart, in pixels. */
const rowHeight = 22;
const letterWidth = 9.6;

function fieldIn(box: HTMLElement | null): HTMLTextAreaElement | null {
  return box?.querySelector("textarea") ?? null;
}

/** Takes the caret to a place in the text of the chart, rows and columns counted from 0, and into view. */
export function showInChart(box: HTMLElement | null, row: number, column: number, length: number): void {
  const field = fieldIn(box);
  if (!field) return;
  const before = field.value.split("\n").slice(0, row);
  const start = before.reduce((sum, line) => sum + line.length + 1, 0) + column;
  field.focus({ preventScroll: true });
  field.setSelectionRange(start, start + length);
  field.scrollTop = Math.max(0, row * rowHeight - field.clientHeight / 3);
  field.scrollLeft = Math.max(0, column * letterWidth - field.clientWidth / 2);
  field.scrollIntoView({ block: "nearest" });
}

/** The row that the caret stands in, from 0. */
export function caretRow(box: HTMLElement | null): number {
  const field = fieldIn(box);
  return field ? field.value.slice(0, field.selectionStart).split("\n").length - 1 : 0;
}

/** After a step back or forth: the caret goes behind what changed, not to the end of the text. */
export function caretToChange(box: HTMLElement | null, before: string, now: string): void {
  const field = fieldIn(box);
  if (!field || document.activeElement !== field || before === now) return;
  let tail = 0;
  const most = Math.min(before.length, now.length);
  while (tail < most && before[before.length - 1 - tail] === now[now.length - 1 - tail]) tail += 1;
  let head = 0;
  while (head < most - tail && before[head] === now[head]) head += 1;
  const caret = Math.max(head, now.length - tail);
  field.setSelectionRange(caret, caret);
}
