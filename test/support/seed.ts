/** Property tests try the same cases every time, so that a failure is there again when it is looked for. */
import fc from 'fast-check'

fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: 20_261_201 })
