import "server-only";

export { contentHash } from "./rules/content-hash";
export { sign, signaturesUnder } from "./sign";
export { dailyCheckpoint, scheduleCheckpoint, sendCheckpoint } from "./send-checkpoint";
