import "server-only";

export { contentHash } from "./rules/content-hash";
export { dailyCheckpoint, scheduleCheckpoint, sendCheckpoint } from "./send-checkpoint";
export { sign, signaturesUnder } from "./sign";
