import http from "node:http";

/** Small enough to add little to what is measured; connections are kept, as browsers keep them. */
const agent = new http.Agent({ keepAlive: true });

/**
 * One request, read to its last byte.
 * @returns {Promise<{ status: number, headers: import("node:http").IncomingHttpHeaders, bytes: Buffer }>}
 */
export function ask(url, { method = "GET", headers = {}, body } = {}) {
  return new Promise((resolve, reject) => {
    const length = body === undefined ? {} : { "content-length": Buffer.byteLength(body) };
    const options = { method, agent, headers: { ...headers, ...length } };
    const request = http.request(url, options, (answer) => {
      const chunks = [];
      answer.on("data", (chunk) => chunks.push(chunk));
      answer.on("error", reject);
      answer.on("end", () =>
        resolve({
          status: answer.statusCode,
          headers: answer.headers,
          bytes: Buffer.concat(chunks),
        }),
      );
    });
    request.on("error", reject);
    request.end(body);
  });
}

/** The same, refusing every answer but a good one: an error page must not be measured as a page. */
export async function askWell(url, options) {
  const answer = await ask(url, options);
  if (answer.status >= 200 && answer.status < 300) return answer;
  const said = answer.bytes.toString("utf8").slice(0, 300);
  throw new Error(`${options?.method ?? "GET"} ${url} answered ${answer.status}: ${said}`);
}

/** @returns {Promise<any>} the JSON that comes back */
export async function askJson(url, { json, headers = {}, ...options } = {}) {
  const body = json === undefined ? undefined : JSON.stringify(json);
  const type = json === undefined ? {} : { "content-type": "application/json" };
  const answer = await askWell(url, { ...options, headers: { ...headers, ...type }, body });
  return JSON.parse(answer.bytes.toString("utf8"));
}

const cookiesOf = (answer) =>
  (answer.headers["set-cookie"] ?? []).map((cookie) => cookie.split(";")[0]);

/** Signs in as the form does. @returns the cookie header of that person */
export async function signIn(base, { email, password }) {
  const csrf = await askWell(`${base}/api/auth/csrf`);
  const { csrfToken } = JSON.parse(csrf.bytes.toString("utf8"));
  const body = new URLSearchParams({ csrfToken, email, password, json: "true" }).toString();
  const answer = await askWell(`${base}/api/auth/callback/credentials`, {
    method: "POST",
    headers: {
      cookie: cookiesOf(csrf).join("; "),
      "content-type": "application/x-www-form-urlencoded",
    },
    body,
  });
  const cookie = cookiesOf(answer).find((text) => text.includes("session-token"));
  if (!cookie) throw new Error(`signing in as ${email} gave no session`);
  return cookie;
}
