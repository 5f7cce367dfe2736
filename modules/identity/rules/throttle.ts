import { MINUTE_MS } from "@/lib/clock";

export type ThrottleState = { windowStartedAt: number; failures: number };

export const THROTTLE_WINDOW_MS = 15 * MINUTE_MS;
/** Failed tries in a window after which an account, or an address, must wait until the window ends. */
export const MAX_FAILURES = { account: 8, address: 40 } as const;

/** Whether another try may be made now. */
export function mayTry(
  state: ThrottleState | undefined,
  kind: keyof typeof MAX_FAILURES,
  now: number,
): boolean {
  if (!state || now - state.windowStartedAt >= THROTTLE_WINDOW_MS) return true;
  return state.failures < MAX_FAILURES[kind];
}

/** The state after one more failure. */
export function afterFailure(state: ThrottleState | undefined, now: number): ThrottleState {
  if (!state || now - state.windowStartedAt >= THROTTLE_WINDOW_MS)
    return { windowStartedAt: now, failures: 1 };
  return { ...state, failures: state.failures + 1 };
}
