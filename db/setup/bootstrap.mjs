/**
 * The first thing that `npm start`, `npm run dev` and `npm test` run. It uses nothing but Node, since
 * a clone that was never touched has no packages: it installs them, then hands over to TypeScript.
 */
import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
const scripts = { start: ['start.ts'], dev: ['start.ts', '--dev'], test: ['test.ts'] };
const oldestNode = [20, 19];

/** The program that runs right now; signals are passed on to it. */
let child;
let signalled = false;

const [command = '', ...args] = process.argv.slice(2);
if (!Object.hasOwn(scripts, command)) {
  stop(`expected one of ${Object.keys(scripts).join(', ')}, not "${command}"`);
}
checkNode();
passSignalsOn();
if (!isInstalled()) await install();
process.exit(await handOver());

function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > oldestNode[0] || (major === oldestNode[0] && minor >= oldestNode[1])) return;
  stop(`Valveside needs Node ${oldestNode.join('.')} or newer, not ${process.versions.node}.`);
}

/**
 * Compares the lock file with npm's own record of what it put into node_modules, which it writes
 * last. So a pulled commit that brings packages, and an install that was cut short, are both seen.
 */
function isInstalled() {
  try {
    const wanted = readJson('package-lock.json').packages;
    const installed = readJson('node_modules/.package-lock.json').packages;
    return Object.entries(wanted).every(
      ([path, { version, optional }]) =>
        path === '' || optional || installed[path]?.version === version,
    );
  } catch {
    return false;
  }
}

function readJson(file) {
  return JSON.parse(readFileSync(join(root, file), 'utf8'));
}

async function install() {
  console.log('Installing npm packages …');
  // The build tools are development packages, which NODE_ENV=production would leave out.
  const code = await run('npm', ['ci', '--include=dev', '--loglevel=error'], 'ignore');
  if (code !== 0) stop('npm could not install the packages; its words stand above.');
}

/** The channel to the script tells it when we are gone, even when we are killed outright. */
function handOver() {
  const [script, ...fixed] = scripts[command];
  const file = join(root, 'db', 'setup', script);
  return run(process.execPath, ['--import', 'tsx', file, ...fixed, ...args], 'ipc');
}

function run(program, words, channel) {
  const stdio = ['ignore', 'inherit', 'inherit', channel];
  child = spawn(program, words, { cwd: root, stdio });
  return new Promise((resolve) => {
    child.on('error', (error) => {
      console.error(error.message);
      resolve(1);
    });
    child.on('exit', (code) => resolve(signalled && code === null ? 0 : (code ?? 1)));
  });
}

function passSignalsOn() {
  const pass = (signal) => {
    signalled = true;
    child?.kill(signal);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, pass);
  // Killed outright, npm takes nobody with it, and its server would stay.
  const npm = npmAbove();
  if (npm) setInterval(() => isAlive(npm) || pass('SIGTERM'), 1000).unref();
}

/** npm is our parent, or its shell is; nobody else's end concerns us. */
function npmAbove() {
  if (!process.env.npm_lifecycle_event) return undefined;
  const candidates = [process.ppid, parentOf(process.ppid)];
  return candidates.find((pid) => readProcess(pid, 'cmdline').startsWith('npm'));
}

function parentOf(pid) {
  return Number(/^PPid:\s*(\d+)/m.exec(readProcess(pid, 'status'))?.[1] ?? 0);
}

function isAlive(pid) {
  return readProcess(pid, 'cmdline').startsWith('npm');
}

function readProcess(pid, file) {
  try {
    return readFileSync(`/proc/${pid}/${file}`, 'utf8');
  } catch {
    return '';
  }
}

function stop(words) {
  console.error(words);
  process.exit(1);
}
