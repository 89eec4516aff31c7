import { createServer } from 'vite';

// Run from here, not by its own command, so that it announces itself as the server does.
const server = await createServer();
await server.listen();
console.log(`holdoff listening ${server.resolvedUrls?.local[0] ?? ''}`);
process.once('SIGTERM', () => void server.close().then(() => process.exit(0)));
