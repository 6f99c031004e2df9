// npm run dev: the service from its build, the client from Vite with hot reload, on the usual two ports.
import { spawn } from 'node:child_process';
import { build, install, requireNode, root } from './steps.mjs';

requireNode();
install();
build();

const children = [
  spawn(process.execPath, ['service/dist/main.js'], { cwd: root, stdio: 'inherit' }),
  spawn('npm', ['run', 'dev', '-w', 'ui'], { cwd: root, stdio: 'inherit' }),
];
const stop = () => children.forEach((child) => child.kill('SIGTERM'));
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, stop);
children.forEach((child) => child.on('exit', stop));
