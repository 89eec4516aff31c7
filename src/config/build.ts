declare const __APP_VERSION__: string;
declare const __BUILD_TIME__: string;

/** Version of the package this bundle was made from. */
export const appVersion: string = __APP_VERSION__;

/**
 * Moment of the build, ISO 8601 in UTC. A tablet whose clock reads earlier than this has lost its time:
 * it can reach no server over TLS, and has to be told so.
 */
export const buildTime: string = __BUILD_TIME__;
