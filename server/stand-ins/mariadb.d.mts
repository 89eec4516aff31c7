export interface MariaDbOptions {
  /** Absolute path. Gets `mariadb/` (the data), `log/mariadb.log` and, unless the path is too long, the socket. */
  readonly folder: string;
  /** On 127.0.0.1. */
  readonly port: number;
  /** Write every commit through to the disk (default). Tests need only outlast a killed process. */
  readonly outlastsPowerCut?: boolean;
}

export interface MariaDb {
  readonly socket: string;
  readonly port: number;
  readonly logFile: string;
  /** Sets the data folder up if there is none; says whether it did. */
  initialise(): Promise<boolean>;
  /** Returns when statements are answered; also after `kill`. Needs `initialise`. */
  start(): Promise<void>;
  stop(): Promise<void>;
  /** `kill -9`, for tests. */
  kill(): Promise<void>;
  /** Ends a server that an earlier, killed process left on this folder; says whether there was one. */
  stopLeftover(): Promise<boolean>;
  /** Runs statements as administrator over the socket; answers tab-separated rows. Throws when refused. */
  sql(statements: string): Promise<string>;
  /** Called when the server ends without `stop` or `kill`. */
  onUnexpectedExit(watcher: () => void): void;
}

export declare function createMariaDb(options: MariaDbOptions): MariaDb;

/** Statements that make a database and a user with every right in it, and in it alone; may run again. */
export declare function createDatabaseSql(settings: {
  readonly name: string;
  readonly user: string;
  readonly password: string;
}): string;
