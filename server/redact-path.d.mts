export declare function redactPath(url: string): string;
