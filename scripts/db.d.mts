export type RunningDb = { pid: number; port: number; isReused: boolean; stop: () => Promise<{ stoppedInMs: number }> };

export declare const debianPackages: string[];
export declare function findMariadb(): { server: string | null; install: string | null; isComplete: boolean };
export declare function isAlive(pid: number): boolean;
export declare function isGreeting(options: { port: number; timeoutMs?: number }): Promise<boolean>;
export declare function isPortFree(port: number): Promise<boolean>;
export declare function missingMessage(): string;
export declare function startDb(options: {
  dir: string;
  port: number;
  password: string;
  database?: string;
  user?: string;
  isThrowAway?: boolean;
  queryLog?: string;
  log?: (line: string) => void;
}): Promise<RunningDb>;
