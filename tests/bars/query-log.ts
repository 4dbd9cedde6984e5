import { closeSync, openSync, readFileSync, readSync, statSync } from "node:fs";

/** How far the log had come. */
export type Mark = number;

export const markOf = (file: string): Mark => statSync(file).size;

/** The statements that the server was given since a mark, without what a connection says of itself. */
export function statementsSince(file: string, mark: Mark = 0): string[] {
  const sizeBytes = statSync(file).size - mark;
  const bytes = Buffer.alloc(sizeBytes);
  const handle = openSync(file, "r");
  try {
    readSync(handle, bytes, 0, sizeBytes, mark);
  } finally {
    closeSync(handle);
  }
  return parse(bytes.toString("utf8")).filter((statement) => !/^(set session|set transaction|start transaction|begin|commit|rollback|select 1$)/i.test(statement));
}

export const allStatements = (file: string): string[] => parse(readFileSync(file, "utf8"));

// A line of the general log: an instant or nothing, the connection, the command, the statement; statements may span lines.
const entry = /^(?:\d{6}\s+\d{1,2}:\d\d:\d\d)?\t\s*\d+ (Connect|Query|Execute|Prepare|Close stmt|Reset stmt|Quit|Init DB|Statistics|Ping)\t?(.*)$/;

function parse(text: string): string[] {
  const statements: string[] = [];
  let isStatement = false;
  for (const line of text.split("\n")) {
    const found = entry.exec(line);
    if (found) {
      isStatement = found[1] === "Query" || found[1] === "Execute";
      if (isStatement) statements.push(found[2]!);
    } else if (isStatement && line !== "") statements[statements.length - 1] += ` ${line.trim()}`;
  }
  return statements.map((statement) => statement.replace(/\s+/g, " ").trim());
}
