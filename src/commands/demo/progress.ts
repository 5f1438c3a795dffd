import type { Progress } from '../../demo/log-scenario.ts';

const everyMs = { terminal: 100, other: 3000 };

/** One line that is rewritten on a terminal; elsewhere a line every few seconds. */
export function progressLine(stream: NodeJS.WriteStream): { show: Progress; end: () => void } {
  const terminal = stream.isTTY;
  let shownAt = 0;
  let open = false;
  const show: Progress = (done, total, what) => {
    const now = Date.now();
    if (done < total && now - shownAt < (terminal ? everyMs.terminal : everyMs.other)) return;
    shownAt = now;
    const line = `${done} of ${total} ${what}`;
    stream.write(terminal ? `\r\u001b[2K${line}` : `${line}\n`);
    open = terminal;
  };
  const end = () => {
    if (open) stream.write('\n');
    open = false;
  };
  return { show, end };
}
