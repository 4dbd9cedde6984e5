// `npm run serve`: all that `npm start` prepares, with the framework's own server instead of ours
import { runProduct } from "./run-product.mjs";

// It never ends by itself while the database pool is open.
await runProduct({ server: { args: ["node_modules/@react-router/serve/bin.js", "build/server/index.js"], stopWithinMs: 2_000 } });
