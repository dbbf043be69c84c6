import type { RunningServer } from "./server";

/** A person at a page without script: signs in, reads pages, sends forms; answers are pages as text. */
export class FormVisitor {
  private cookie = "";

  constructor(private readonly server: RunningServer) {}

  async signIn(email: string, password: string): Promise<void> {
    const { status, headers } = await this.fetch("/sign-in", { email, password });
    if (status !== 302) throw new Error(`${email} cannot sign in: ${status}`);
    this.cookie = headers.get("set-cookie")?.split(";")[0] ?? "";
  }

  async open(path: string): Promise<{ status: number; text: string }> {
    const response = await this.fetch(path);
    return { status: response.status, text: await response.text() };
  }

  /** Sends a form; `location` is where an accepted one leads. */
  async send(path: string, fields: Record<string, string>) {
    const response = await this.fetch(path, fields);
    return {
      status: response.status,
      location: response.headers.get("location") ?? "",
      text: await response.text(),
    };
  }

  private fetch(path: string, fields?: Record<string, string>): Promise<Response> {
    return fetch(this.server.address + path, {
      redirect: "manual",
      headers: { Cookie: this.cookie, Origin: this.server.address },
      ...(fields ? { method: "POST", body: new URLSearchParams(fields) } : {}),
    });
  }
}
