/**
 * Digests of the style and the script, SHA-256 in base 64, as the policy names them; the core has no digest of its own, and
 * the test in test/report/document/policy.test.ts says what to write here when one of the two has changed.
 */
const STYLE_DIGEST = 'sha256-+10InAvcr//whxAEV3FbJexUv9GgPSCqa5tPjeaFKRg=';
const SCRIPT_DIGEST = 'sha256-qjCWKEG8wn0JNOXl1GqBiChKcKu/fz8XZ/EJLI9OdE4=';

/** What the document may do: use its own style and script, and nothing else; no request of any kind. */
export const POLICY: string = [
  "default-src 'none'",
  `style-src '${STYLE_DIGEST}'`,
  `script-src '${SCRIPT_DIGEST}'`,
  "base-uri 'none'",
  "form-action 'none'",
].join('; ');
