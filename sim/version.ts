/**
 * Version of the engine, stored with every run. Raised in its last part when only wording or speed changes, in the
 * middle when a figure may differ within its stated tolerance, and in the first when a figure or a definition changes
 * by more than that.
 */
export const engineVersion = '1.0.0'
