export function serve(wantedPort?: number): Promise<{ url: string; stop(): Promise<void> }>;
