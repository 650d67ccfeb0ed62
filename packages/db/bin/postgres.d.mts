export interface Cluster {
  /** Where the data lie, which is not where they were wanted when the server's account cannot reach that folder. */
  home: string;
  port: number;
  /** Whether this call started the server, or found it running. */
  startedHere: boolean;
  /** The address of a database as the superuser. */
  url: (database: string) => string;
  stop: () => void;
}

export function startCluster(options: { home: string; port: number; durable: boolean }): Cluster;
