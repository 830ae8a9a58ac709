import * as v from 'valibot';
import { fileKey, fromFileKeys, toFileKeys } from './file-keys.ts';
import { jsonIn } from './json-object.ts';
import { policySchema, type Policy } from './policy-schema.ts';

const POLICY_FORMAT = 'normloom-policy';
const POLICY_VERSION = 1;

/** The text of a `*.policy.json` file: JSON to be read and edited by people, one value and one source a threshold. */
export function policyToText(policy: Policy): string {
  const thresholds: unknown = toFileKeys(policy);
  return `${JSON.stringify({ format: POLICY_FORMAT, version: POLICY_VERSION, ...Object(thresholds) }, null, 1)}\n`;
}

export type PolicyRead =
  { readonly ok: true; readonly policy: Policy } | { readonly ok: false; readonly problem: string };

/** Reads the text of a policy. Unknown keys are left behind; whatever is wrong comes back as a sentence. */
export function policyFromText(text: string): PolicyRead {
  const value = jsonIn(text);
  if (value === undefined) {
    return { ok: false, problem: 'The policy is not complete JSON. Look for a missing comma, quote or brace.' };
  }
  const head = v.safeParse(v.object({ format: v.literal(POLICY_FORMAT), version: v.number() }), value);
  if (!head.success) {
    return { ok: false, problem: `This is not a policy. It begins with "format": "${POLICY_FORMAT}" and a version.` };
  }
  if (head.output.version !== POLICY_VERSION) {
    return {
      ok: false,
      problem: `The policy has version ${head.output.version}; this program reads version ${POLICY_VERSION}.`,
    };
  }
  const parsed = v.safeParse(policySchema, fromFileKeys(value));
  if (parsed.success) return { ok: true, policy: parsed.output };
  const issue = parsed.issues[0];
  const where = v.getDotPath(issue);
  return {
    ok: false,
    problem: `The policy cannot be used: ${where === null ? '' : `${fileKey(where)}: `}${issue.message}.`,
  };
}
