import { spawn, type ChildProcess } from "node:child_process";
import { randomUUID } from "node:crypto";
import { createServer } from "node:net";
import { join } from "node:path";
import { Client } from "pg";

const root = join(__dirname, "..", "..");

/** The whole product as one runs it: the real server on a database of its own, serving the built client. */
export interface Product {
  address: string;
  /** does something in its database that no page does */
  query(sql: string): Promise<void>;
  stop(): Promise<void>;
}

/** Starts the product on a fresh database; the demonstration is loaded into it as on a first start. */
export async function startProduct(): Promise<Product> {
  const admin = process.env.TEST_DATABASE_URL;
  if (!admin) throw new Error("TEST_DATABASE_URL is not set: run the journeys by npm test.");
  const name = `journey_${randomUUID().replaceAll("-", "")}`;
  await asAdmin(admin, `CREATE DATABASE ${name}`);
  const databaseUrl = Object.assign(new URL(admin), { pathname: `/${name}` }).href;
  const port = await freePort();
  const server = spawn(process.execPath, ["--import", "tsx", join(root, "server", "main.ts")], {
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: "development",
      PORT: String(port),
      PUBLIC_URL: `http://localhost:${port}`,
      DATABASE_URL: databaseUrl,
      TOKEN_SECRET: randomUUID() + randomUUID(),
      LOG_LEVEL: "error",
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  await ready(server);
  return {
    address: `http://localhost:${port}`,
    query: (sql) => asAdmin(databaseUrl, sql),
    async stop() {
      const ended = new Promise<number | null>((done) => server.once("exit", (code) => done(code)));
      server.kill("SIGTERM");
      const code = await ended;
      await asAdmin(admin, `DROP DATABASE ${name} WITH (FORCE)`);
      if (code !== 0) throw new Error(`The server ended with ${code}.`);
    },
  };
}

async function asAdmin(url: string, sql: string): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}

function ready(server: ChildProcess): Promise<void> {
  return new Promise((done, fail) => {
    let output = "";
    const listen = (data: Buffer) => {
      output += data.toString();
      if (output.includes("is ready")) done();
    };
    server.stdout?.on("data", listen);
    server.stderr?.on("data", listen);
    server.once("exit", (code) => fail(new Error(`The server ended with ${code} before it was ready:\n${output}`)));
  });
}

function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer();
    probe.once("error", fail);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() => (typeof address === "object" && address ? done(address.port) : fail(new Error("no port"))));
    });
  });
}
