/** A reason to stop that the reader can act on; it is printed as it is, without a stack. */
export class Stop extends Error {
  name = 'Stop';
}

export function say(text = '') {
  process.stdout.write(`${text}\n`);
}

/** Prints why a launcher could not go on: one line for a Stop, the stack for anything unforeseen. */
export function sayWhy(error) {
  process.stderr.write(`${error instanceof Stop ? error.message : reasonOf(error)}\n`);
}

function reasonOf(error) {
  const denied = error?.code === 'EACCES' || error?.code === 'EPERM' || error?.code === 'EROFS';
  if (denied && error.path) {
    return `${error.path} cannot be written by this user. Make it writable, or set RATEWELL_HOME to a folder of your own.`;
  }
  if (error?.code === 'ENOSPC') return 'The disk is full. Free some space and start again.';
  return error?.stack ?? String(error);
}

/** The rows as lines of aligned columns, indented by two. */
export function table(rows) {
  const widths = [];
  for (const row of rows) {
    row.forEach((cell, column) => {
      widths[column] = Math.max(widths[column] ?? 0, cell.length);
    });
  }
  return rows
    .map((row) =>
      `  ${row.map((cell, column) => cell.padEnd(widths[column])).join('   ')}`.trimEnd(),
    )
    .join('\n');
}
