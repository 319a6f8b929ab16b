/** Gives the moment, in milliseconds since 1970, UTC. Services get it, so that tests hold the time. */
export type Clock = () => number
