import "reflect-metadata";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { createApp } from "./createApp";
import { createJobs } from "./createJobs";
import { createDataSource } from "./database/dataSource";
import { demoSignIns, loadDemoScenario } from "./database/demoScenario";
import { migrate } from "./database/migrate";
import { EnvError, readEnv } from "./env";
import { createLogger } from "./http/requestLog";
import { startWorker } from "./jobs/jobWorker";
import type { FakeS3 } from "./storage/fake/fakeS3";
import { ObjectStore } from "./storage/objectStore.service";

/** How long a request may still take after the server was told to stop. */
const patienceMs = 5000;

/** What stands in the way of a start, in a sentence. */
class StartError extends Error {}

async function main(): Promise<void> {
  const env = readEnv();
  const logger = createLogger(env.logLevel);
  await migrate(env.databaseUrl).catch((error: unknown) => {
    throw new StartError(`The database does not answer or cannot be brought up to date: ${describe(error)}`);
  });
  const dataSource = await createDataSource(env.databaseUrl, (error) => logger.warn(error)).initialize();
  if (env.demo) await loadDemoScenario(dataSource);
  const signIns = env.demo ? await demoSignIns(dataSource) : [];

  const fakeSmtp =
    env.smtpUrl === null && !env.production
      ? await (await import("./mail/inbox/fakeSmtp")).FakeSmtp.start()
      : undefined;
  const fakeS3 =
    env.storage === null ? await (await import("./storage/fake/fakeS3")).FakeS3.start(env.storageDir) : undefined;
  const objects = new ObjectStore(env.storage ?? (fakeS3 as FakeS3).settings);
  const { app } = createApp(dataSource, logger, { ...env, fakeSmtp, objects });
  const server = createServer(app);
  await new Promise<void>((resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) => {
      const inUse = error.code === "EADDRINUSE";
      reject(
        new StartError(
          inUse
            ? `Port ${env.port} is in use. Choose another one with PORT.`
            : `Cannot listen on ${env.host}:${env.port}: ${error.message}`,
        ),
      );
    });
    server.listen(env.port, env.host, resolve);
  });

  const { port } = server.address() as AddressInfo;
  const host = env.host.includes(":") ? `[${env.host}]` : env.host;
  const here = `http://${host}:${port}`;
  const origin = env.publicOrigin ?? here;
  const jobs = createJobs(dataSource, { ...env, objects, origin, smtpUrl: env.smtpUrl ?? fakeSmtp?.url ?? "" });
  const worker = await startWorker(env.databaseUrl, jobs, logger);

  let stopping = false;
  // Ctrl-C reaches this process from the terminal and again from the start script.
  const stop = () => {
    if (stopping) return;
    stopping = true;
    setTimeout(() => server.closeAllConnections(), patienceMs).unref();
    const served = new Promise<void>((resolve) => server.close(() => resolve()));
    void Promise.all([served, worker.stop()]).then(async () => {
      jobs.close();
      await Promise.all([dataSource.destroy(), fakeSmtp?.stop(), fakeS3?.stop()]);
    });
  };
  process.on("SIGINT", stop);
  process.on("SIGTERM", stop);

  say(`Larkspan is ready at ${origin}`);
  if (fakeSmtp) say(`  No SMTP_URL is set, so mails are sent to nobody: read them at ${here}/dev/inbox`);
  for (const { name, role, email, password } of signIns) {
    say(`  ${name} (${role}): ${email}, password "${password}"`);
  }
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

function describe(error: unknown): string {
  if (error instanceof AggregateError) return error.errors.map(describe).join("; ");
  return error instanceof Error ? error.message : String(error);
}

main().catch((error: unknown) => {
  const known = error instanceof EnvError || error instanceof StartError;
  const lines =
    error instanceof EnvError ? ["The environment is not right:", ...error.lines.map((line) => `  ${line}`)] : [];
  process.stderr.write(
    known
      ? `${(lines.length > 0 ? lines : [error.message]).join("\n")}\n`
      : `${error instanceof Error ? error.stack : String(error)}\n`,
  );
  process.exit(1);
});
