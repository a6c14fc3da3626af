/** Runs once when the server starts: checks the environment, then works off tasks beside serving. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { startWorkingBeside } = await import("@/lib/server/tasks/start");
  startWorkingBeside();
}
