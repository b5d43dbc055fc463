import type { Metres, MetresToTheFourth, SquareMetres } from '../units/quantity'
import { type Core, coreArea, coreSecondMoment } from './core-section'
import { roundArea, roundSecondMoment } from './round-section'

/** The section that bears the load: stretch, bending and breaking follow from it. */
export interface LoadBearingSection {
  /** Diameter, or distance across flats, by which tables give the strength, m. */
  readonly size: Metres
  readonly area: SquareMetres
  readonly secondMoment: MetresToTheFourth
}

/**
 * What bears the load of a string of outer diameter d: the core where there is one (a wrap carries nothing, and
 * EI of the core is a lower bound of the bending stiffness), else the whole round section. SI.
 * Throws a RangeError for sizes not above zero. Source: geometry.
 */
export const loadBearingSection = (core: Core | undefined, outer: Metres): LoadBearingSection =>
  core
    ? { size: core.size, area: coreArea(core), secondMoment: coreSecondMoment(core) }
    : { size: outer, area: roundArea(outer), secondMoment: roundSecondMoment(outer) }
