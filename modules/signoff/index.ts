import "server-only";

export { contentHash } from "./rules/content-hash";
export { sign, signaturesUnder } from "./sign";
