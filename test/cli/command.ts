import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";

/** The built command. */
export const COMMAND = fileURLToPath(new URL("../../dist/cli.js", import.meta.url));

/** How a run of the command ended. */
export interface Run {
  readonly status: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs the built command in a folder. */
export function apsidary(args: readonly string[], cwd: string): Promise<Run> {
  if (!existsSync(COMMAND)) throw new Error("dist/cli.js is not there; run npm run build before these tests");
  return new Promise((done, failed) => {
    const child = spawn(process.execPath, [COMMAND, ...args], { cwd, stdio: ["ignore", "pipe", "pipe"] });
    let stdout = "";
    let stderr = "";
    child.stdout.setEncoding("utf8").on("data", (text: string) => {
      stdout += text;
    });
    child.stderr.setEncoding("utf8").on("data", (text: string) => {
      stderr += text;
    });
    child.on("error", failed);
    child.on("close", (status) => done({ status, stdout, stderr }));
  });
}
