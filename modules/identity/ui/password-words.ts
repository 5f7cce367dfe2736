import { PASSWORD_MIN_LENGTH } from "../model";

/** Length counts, not odd signs (NIST SP 800-63B, 5.1.1.2). */
export const PASSWORD_HINT = `At least ${PASSWORD_MIN_LENGTH} characters. A few words in a row make a good password and are easy to keep in mind.`;

export const PASSWORD_LABELS = {
  current: "Your password now",
  password: "New password",
  again: "The same again",
};
export const NOT_THE_SAME = "This is not the same as above.";
