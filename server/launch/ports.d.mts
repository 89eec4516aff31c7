/** A port on loopback that was free a moment ago. */
export declare function freePort(): Promise<number>;
