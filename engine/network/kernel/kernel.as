// What the host sees of the kernel.

export { attach } from "./fields";
export { begin, clear, failedSlot, openRecords, recordCount, run, stateNow, totalIterations, unconverged, worstBalance } from "./step";
