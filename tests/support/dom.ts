import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

declare global {
  var IS_REACT_ACT_ENVIRONMENT: boolean | undefined;
}

// What Testing Library does by itself only where test functions are global.
globalThis.IS_REACT_ACT_ENVIRONMENT = true;
afterEach(cleanup);
