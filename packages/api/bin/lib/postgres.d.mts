/** A running PostgreSQL on 127.0.0.1, shared with other commands; the last one to close it stops it. */
export interface Cluster {
  port: number;
  /** Connection strings of the two roles to the database `driprail`. */
  urls: { app: string; owner: string };
  close: () => Promise<void>;
}

export function openPrivateCluster(): Promise<Cluster>;
export function openTestCluster(): Promise<Cluster>;
