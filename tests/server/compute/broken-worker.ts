/** A worker file that cannot even be loaded. */
throw new Error('this thread never starts')
