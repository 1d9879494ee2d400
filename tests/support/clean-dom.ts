import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// Testing Library cleans up by itself only when the test functions are globals; ours are imported.
afterEach(cleanup);
