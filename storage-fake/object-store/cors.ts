import type { IncomingMessage, ServerResponse } from "node:http";
import { StoreError, malformedXml } from "./errors";
import { type XmlElement, type XmlNode, childText, childrenNamed } from "./xml";

export interface CorsRule {
  allowedOrigins: string[];
  allowedMethods: string[];
  allowedHeaders: string[];
  exposeHeaders: string[];
  maxAgeSeconds?: number;
}

const METHODS = ["GET", "PUT", "POST", "DELETE", "HEAD"];

/** @throws StoreError 400 for a rule without origin or method, or with two stars in one value. */
export function corsRulesFromXml(root: XmlElement): CorsRule[] {
  const rules = childrenNamed(root, "CORSRule").map((rule): CorsRule => {
    const texts = (name: string) => childrenNamed(rule, name).map((child) => child.text.trim());
    const maxAge = childText(rule, "MaxAgeSeconds");
    if (maxAge !== undefined && !/^\d{1,9}$/.test(maxAge)) throw malformedXml();
    return {
      allowedOrigins: texts("AllowedOrigin"),
      allowedMethods: texts("AllowedMethod"),
      allowedHeaders: texts("AllowedHeader"),
      exposeHeaders: texts("ExposeHeader"),
      ...(maxAge === undefined ? {} : { maxAgeSeconds: Number(maxAge) }),
    };
  });
  if (rules.length === 0 || rules.length > 100) throw malformedXml();
  for (const rule of rules) {
    if (rule.allowedOrigins.length === 0 || rule.allowedMethods.length === 0) throw malformedXml();
    const method = rule.allowedMethods.find((name) => !METHODS.includes(name));
    const twoStars = [...rule.allowedOrigins, ...rule.allowedHeaders].find(
      (value) => value.split("*").length > 2,
    );
    if (method !== undefined || twoStars !== undefined) {
      throw new StoreError(
        400,
        "InvalidRequest",
        `A CORS rule cannot be used because of ${method ?? twoStars}.`,
      );
    }
  }
  return rules;
}

export function corsRulesToXml(rules: CorsRule[]): XmlNode[] {
  const each = (name: string, values: string[]) => values.map((value): XmlNode => [name, value]);
  return rules.map((rule) => [
    "CORSRule",
    [
      ...each("AllowedOrigin", rule.allowedOrigins),
      ...each("AllowedMethod", rule.allowedMethods),
      ...each("AllowedHeader", rule.allowedHeaders),
      ...each("ExposeHeader", rule.exposeHeaders),
      ...(rule.maxAgeSeconds === undefined
        ? []
        : [["MaxAgeSeconds", rule.maxAgeSeconds] satisfies XmlNode]),
    ],
  ]);
}

function matches(pattern: string, value: string): boolean {
  const star = pattern.indexOf("*");
  if (star < 0) return pattern === value;
  const before = pattern.slice(0, star);
  const after = pattern.slice(star + 1);
  return (
    value.length >= before.length + after.length &&
    value.startsWith(before) &&
    value.endsWith(after)
  );
}

function requestedHeaders(incoming: IncomingMessage): string[] {
  return (incoming.headers["access-control-request-headers"] ?? "")
    .split(",")
    .map((name) => name.trim().toLowerCase())
    .filter((name) => name !== "");
}

/** Adds the CORS headers of the first rule that fits. False when no rule does. */
export function applyCors(
  incoming: IncomingMessage,
  response: ServerResponse,
  rules: CorsRule[],
): boolean {
  const origin = incoming.headers.origin;
  if (origin === undefined) return false;
  const preflight = incoming.method === "OPTIONS";
  const method = preflight
    ? (incoming.headers["access-control-request-method"] ?? "")
    : (incoming.method ?? "GET");
  const wanted = preflight ? requestedHeaders(incoming) : [];
  const rule = rules.find(
    (candidate) =>
      candidate.allowedOrigins.some((pattern) => matches(pattern, origin)) &&
      candidate.allowedMethods.includes(method) &&
      wanted.every((name) =>
        candidate.allowedHeaders.some((pattern) => matches(pattern.toLowerCase(), name)),
      ),
  );
  response.setHeader(
    "Vary",
    "Origin, Access-Control-Request-Method, Access-Control-Request-Headers",
  );
  if (!rule) return false;
  const anyOrigin = rule.allowedOrigins.includes("*");
  response.setHeader("Access-Control-Allow-Origin", anyOrigin ? "*" : origin);
  response.setHeader("Access-Control-Allow-Methods", rule.allowedMethods.join(", "));
  if (rule.exposeHeaders.length > 0) {
    response.setHeader("Access-Control-Expose-Headers", rule.exposeHeaders.join(", "));
  }
  if (preflight && wanted.length > 0) {
    response.setHeader("Access-Control-Allow-Headers", wanted.join(", "));
  }
  if (preflight && rule.maxAgeSeconds !== undefined) {
    response.setHeader("Access-Control-Max-Age", rule.maxAgeSeconds);
  }
  return true;
}
