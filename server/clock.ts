/** Where the server takes the time from; tests hand in their own. */
export type Clock = () => Date

export const systemClock: Clock = () => new Date()
