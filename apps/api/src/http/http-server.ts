import { createServer, type RequestListener, type Server } from 'node:http'

/** Limits on how much and how slowly a request may come in; whatever goes beyond is cut off by Node itself. */
const LIMITS = {
  maxHeaderSize: 16 * 1024,
  headersTimeout: 20_000,
  requestTimeout: 300_000,
  keepAliveTimeout: 65_000,
  connectionsCheckingInterval: 5000,
}

export const createHttpServer = (listener: RequestListener): Server =>
  createServer(LIMITS, listener)
