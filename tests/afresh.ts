// Test files share a process: each begins with no sheet open, nobody attached, and the units of a new process.
import { attachHost, forgetLedger } from "../lib/sheet/index.ts";

attachHost();
forgetLedger();
