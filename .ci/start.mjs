// npm start: installs, builds, then serves. The server migrates and, in demo mode, seeds before it listens.
import { spawn } from 'node:child_process';
import { build, install, requireNode, root } from './steps.mjs';

requireNode();
install();
build();

const server = spawn(process.execPath, ['service/dist/main.js'], { cwd: root, stdio: 'inherit' });
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code, signal) => process.exit(code ?? (signal ? 0 : 1)));
