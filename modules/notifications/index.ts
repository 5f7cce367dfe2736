import "server-only";

export { notificationsMay } from "./abilities";
export { deliverMail } from "./deliver-mail";
export { countMail } from "./queries/count-mail";
export { listMail } from "./queries/list-mail";
export { queueMail } from "./queue-mail";
