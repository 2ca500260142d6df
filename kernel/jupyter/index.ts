export { type Connection, readConnection, readConnectionFile } from "./connection.ts";
export { type ServeOptions, serve } from "./server.ts";
