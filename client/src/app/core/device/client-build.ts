/**
 * Number of this client's build, counted up when a server must be able to refuse older ones. A client
 * that is too old is told so; what it holds is still sent.
 */
export const CLIENT_BUILD = 1;
