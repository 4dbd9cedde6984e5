import type { ChildProcess, SpawnOptions } from "node:child_process";

export type Crew = {
  isBusy: () => boolean;
  start: (command: string, args: string[], options?: SpawnOptions) => ChildProcess;
  run: (command: string, args: string[], options?: SpawnOptions & { isQuiet?: boolean }) => Promise<void>;
  end: (child: ChildProcess, options?: { withinMs?: number }) => Promise<void>;
  endAll: (options?: { withinMs?: number }) => Promise<void>;
};
export declare function createCrew(): Crew;
