// After `next build`: puts what the standalone server serves from disk beside it, so that one folder is the product.
import { cpSync, existsSync } from 'node:fs';
import { join } from 'node:path';

const dist = process.env.COILYARD_DIST ?? '.next';
const target = join(dist, 'standalone');
cpSync('public', join(target, 'public'), { recursive: true });
cpSync(join(dist, 'static'), join(target, dist, 'static'), { recursive: true });
cpSync('templates/fonts', join(target, 'templates/fonts'), { recursive: true });
if (!existsSync(join(target, 'server.js'))) throw new Error(`The build left no ${join(target, 'server.js')}.`);
console.log(`The product stands in ${target}: npm start runs it.`);
