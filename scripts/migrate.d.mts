export declare function runMigrations(url: string): Promise<void>;
