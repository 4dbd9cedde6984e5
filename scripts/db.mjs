// A private MariaDB on loopback. Node built-ins only: `npm start` needs it before packages are installed.
import { spawn, spawnSync } from "node:child_process";
import fs from "node:fs";
import net from "node:net";
import os from "node:os";
import path from "node:path";

const sleep = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/** What Debian calls the server and the two tools it needs; they add no service, no user, nothing that listens. */
export const debianPackages = ["mariadb-server-core", "mariadb-client-core"];

/** @returns paths of the server and of its set-up script, null where not installed */
export function findMariadb() {
  const folders = [...(process.env.PATH ?? "").split(":"), "/usr/sbin", "/usr/local/sbin", "/usr/bin"];
  const find = (name) => folders.map((folder) => path.join(folder, name)).find((file) => isExecutable(file)) ?? null;
  const server = find("mariadbd") ?? find("mysqld");
  const install = find("mariadb-install-db") ?? find("mysql_install_db");
  return { server, install, isComplete: Boolean(server && install && find("my_print_defaults")) };
}

function isExecutable(file) {
  try {
    fs.accessSync(file, fs.constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** A zombie whose parent has not reaped it counts as gone. */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return !/^\d+ \(.*\) Z/s.test(fs.readFileSync(`/proc/${pid}/stat`, "utf8"));
  } catch (error) {
    return error.code === "EPERM";
  }
}

/** MariaDB speaks first: the fifth byte of its greeting is the protocol version, 10. */
export function isGreeting({ port, timeoutMs = 1_000 }) {
  return new Promise((resolve) => {
    const socket = net.connect({ host: "127.0.0.1", port });
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.setTimeout(timeoutMs, () => end(false));
    socket.once("error", () => end(false));
    socket.once("data", (bytes) => end(bytes.length > 5 && bytes[4] === 0x0a));
  });
}

export function isPortFree(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once("error", () => resolve(false));
    server.listen({ port, host: "127.0.0.1", exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/**
 * Starts the server, or takes over one that an earlier start left running on the same folder.
 *
 * @param queryLog for tests: a file that gets every statement
 * @param isThrowAway for tests: nothing is flushed to disk, and the server ends with the process that started it
 */
export async function startDb({ dir, port, password, database = "isogyre", user = "isogyre", isThrowAway = false, queryLog, log = () => {} }) {
  const binaries = findMariadb();
  if (!binaries.isComplete) throw new Error(missingMessage());
  const folder = path.resolve(dir);
  const dataDir = path.join(folder, "data");
  const pidFile = path.join(folder, "mariadbd.pid");
  const logFile = path.join(folder, "mariadbd.log");
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });

  const reused = await takeOver({ pidFile, dataDir, port });
  if (reused) {
    log(`the database of an earlier start is still running (pid ${reused}) and is used`);
    return { pid: reused, port, isReused: true, stop: () => stopByPid(reused) };
  }
  if (!(await isPortFree(port))) throw new Error(`port ${port} is in use by another program`);

  // mariadbd refuses to run as root unless it is told so; "root" works whatever the modes of the folders above.
  const userArgs = process.getuid() === 0 ? ["--user=root"] : [];
  install({ binary: binaries.install, folder, dataDir, userArgs, logFileSize: isThrowAway ? "16M" : "48M" });

  const initFile = path.join(folder, "init.sql");
  fs.writeFileSync(initFile, initSql({ database, user, password }), { mode: 0o600 });
  const args = [
    "--no-defaults", // must come first
    ...userArgs,
    `--datadir=${dataDir}`,
    `--port=${port}`,
    "--bind-address=127.0.0.1",
    // A socket path holds 107 bytes at most: keep it out of a deep checkout.
    `--socket=${path.join(os.tmpdir(), `isogyre-db-${port}-${process.getuid()}.sock`)}`,
    `--pid-file=${pidFile}`,
    `--init-file=${initFile}`,
    "--skip-name-resolve",
    "--skip-log-bin",
    "--character-set-server=utf8mb4",
    "--collation-server=utf8mb4_uca1400_ai_ci",
    "--default-time-zone=+00:00",
    "--max-connections=100",
    "--performance-schema=OFF",
    ...(queryLog ? ["--general-log=1", `--general-log-file=${queryLog}`] : []),
    ...(isThrowAway
      ? ["--innodb-log-file-size=16M", "--innodb-buffer-pool-size=64M", "--innodb-flush-log-at-trx-commit=0", "--innodb-doublewrite=0"]
      : ["--innodb-log-file-size=48M", "--innodb-buffer-pool-size=128M"]),
  ];
  const pid = await launch({ binary: binaries.server, args, folder, logFile, port, isThrowAway });
  return { pid, port, isReused: false, stop: () => stopByPid(pid) };
}

export function missingMessage() {
  return `MariaDB is not installed. Run once as root:\n  apt-get update && apt-get install -y --no-install-recommends ${debianPackages.join(" ")}`;
}

/** @returns the pid of a server of ours that answers on the port, else null; one that does not answer is stopped */
async function takeOver({ pidFile, dataDir, port }) {
  if (!fs.existsSync(pidFile)) return null;
  const pid = Number(fs.readFileSync(pidFile, "utf8"));
  if (!pid || !isAlive(pid) || !fs.readFileSync(`/proc/${pid}/cmdline`, "utf8").split("\0").includes(`--datadir=${dataDir}`)) {
    fs.rmSync(pidFile, { force: true });
    return null;
  }
  for (let tries = 0; tries < 20; tries++) {
    if (await isGreeting({ port })) return pid;
    await sleep(100);
  }
  await stopByPid(pid);
  return null;
}

function install({ binary, folder, dataDir, userArgs, logFileSize }) {
  if (fs.existsSync(path.join(dataDir, "mysql"))) return;
  // Into a folder of its own, then renamed: an interrupted set-up is never taken for a finished one.
  const unfinished = path.join(folder, "data.unfinished");
  fs.rmSync(unfinished, { recursive: true, force: true });
  const result = spawnSync(
    binary,
    ["--no-defaults", `--datadir=${unfinished}`, ...userArgs, "--auth-root-authentication-method=normal", "--skip-test-db", "--skip-name-resolve", `--innodb-log-file-size=${logFileSize}`],
    { encoding: "utf8", cwd: folder },
  );
  if (result.status !== 0) throw new Error(`${path.basename(binary)} failed (${result.status ?? result.signal}):\n${result.stdout}${result.stderr}`);
  fs.renameSync(unfinished, dataDir);
}

/** Run by the server at each start before it accepts connections; one statement a line. */
function initSql({ database, user, password }) {
  const quote = (text) => `'${text.replace(/['\\]/g, "\\$&")}'`;
  const account = `${quote(user)}@'127.0.0.1'`; // with skip-name-resolve "localhost" would not match
  return [
    `CREATE DATABASE IF NOT EXISTS \`${database}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_uca1400_ai_ci;`,
    `CREATE USER IF NOT EXISTS ${account} IDENTIFIED BY ${quote(password)};`,
    `ALTER USER ${account} IDENTIFIED BY ${quote(password)};`,
    `GRANT ALL PRIVILEGES ON \`${database}%\`.* TO ${account};`,
    `ALTER USER 'root'@'localhost' ACCOUNT LOCK;`,
    "FLUSH PRIVILEGES;",
    "",
  ].join("\n");
}

async function launch({ binary, args, folder, logFile, port, isThrowAway }) {
  const output = fs.openSync(logFile, "a");
  // A test run that is killed must not leave a server in memory: the kernel tells it when its parent is gone.
  const canFollowParent = isThrowAway && isExecutable("/usr/bin/setpriv");
  const [command, commandArgs] = canFollowParent ? ["/usr/bin/setpriv", ["--pdeathsig", "TERM", binary, ...args]] : [binary, args];
  // Detached: a terminal's Ctrl-C must reach the application first and the database last.
  const child = spawn(command, commandArgs, { stdio: ["ignore", output, output], detached: true, cwd: folder });
  fs.closeSync(output);
  let ended = null;
  child.once("error", (error) => (ended = error.message));
  child.once("exit", (code, signal) => (ended = String(code ?? signal)));
  const deadline = performance.now() + 60_000;
  while (!(await isGreeting({ port, timeoutMs: 500 }))) {
    if (ended !== null) {
      const tail = fs.readFileSync(logFile, "utf8").split("\n").slice(-12).join("\n");
      throw new Error(`MariaDB ended (${ended}); the last lines of ${logFile}:\n${tail}`);
    }
    if (performance.now() > deadline) {
      child.kill("SIGTERM");
      throw new Error("MariaDB was not ready after 60 s");
    }
    await sleep(25);
  }
  child.unref();
  return child.pid;
}

/** SIGTERM is MariaDB's clean stop; it ignores SIGINT. */
async function stopByPid(pid) {
  const startedAt = performance.now();
  if (isAlive(pid)) process.kill(pid, "SIGTERM");
  while (isAlive(pid)) {
    if (performance.now() - startedAt > 30_000) {
      process.kill(pid, "SIGKILL");
      break;
    }
    await sleep(20);
  }
  return { stoppedInMs: Math.round(performance.now() - startedAt) };
}
