interface Killable {
  kill(): Promise<void>
}

/** Builds what is served and what works, if the build there is not of these sources. */
export function buildProgram(): Promise<void>

/** The built web server as a process of its own. */
export function startServer(environment: Record<string, string>): Promise<Killable & { address: string }>

/** The built worker as a process of its own. */
export function startWorker(environment: Record<string, string>): Promise<Killable>

/** Stops politely whatever of these still runs. */
export function stopEverything(): Promise<void>
