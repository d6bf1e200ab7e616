import type { ItemOf } from '@shared/items/item'
import type { StationType } from '@shared/items/points'
import { formatAttitude } from '@shared/structure/attitude-words'
import { normalizeAzimuth, toDegrees, type Azimuth, type Degrees, type XY } from '@shared/units'
import type { Vector3 } from './fold-belt'
import type { ItemFrame } from './item-frame'
import type { Label } from './labels'
import { misplaced, tilted, type Noise } from './noise'
import { planeOfGradient, planeOfNormal, type GridPlane } from './planes'
import { beddingNormal, lineOf, normalOf, type Measured, type Station } from './stations'
import type { Truth } from './truth'
import { unitLabelOf } from './units'

/** Turns stations and labels of the truth into items of a sheet, with the errors of measuring. */
export class PointItems {
  constructor(
    private readonly frame: ItemFrame,
    private readonly truth: Truth,
    private readonly noise: Noise,
  ) {}

  attitude(station: Station, type: Measured, name: string): ItemOf<'attitude'> {
    const plane = this.measured(station, type)
    const topsKnown =
      type === 'bedding' && topsShown.has(station.rock.layer.label) && this.frame.random() < 0.3
    return {
      kind: 'attitude',
      id: this.frame.id(),
      geometry: this.frame.point(misplaced(station.at, this.noise, this.frame.random)),
      properties: {
        type,
        ...plane,
        undulating: type === 'foliation' && this.frame.random() < 0.3,
        topsKnown: topsKnown && plane.dip > 0 && plane.dip < 90,
        station: name,
        reading: {
          text: formatAttitude(plane, 'strike-dip'),
          convention: 'strike-dip',
          northReference: 'true',
          declination: null,
        },
        note: '',
      },
    }
  }

  /** Whole degrees, as they are read from a compass. */
  private measured(station: Station, type: Measured) {
    const normal = tilted(normalOf(this.truth, station, type), this.noise, this.frame.random)
    const isBedding = type === 'bedding'
    return this.rounded(isBedding ? planeOfGradient(normal) : planeOfNormal(normal), station.at)
  }

  private rounded({ gridStrike, dip, overturned }: GridPlane, at: XY) {
    const whole = Math.round(dip)
    return {
      strike: whole === 0 ? null : this.azimuth(gridStrike, at),
      dip: whole,
      // A bed that reads as level or upright shows no younger side.
      overturned: overturned && whole > 0 && whole < 90,
    }
  }

  private azimuth(gridAzimuth: Degrees, at: XY): Azimuth {
    return normalizeAzimuth(Math.round(gridAzimuth + this.frame.convergenceAt(at)))
  }

  /** A fold axis in the small, or the line in which bedding and cleavage meet, drawn on its plane. */
  lineation(station: Station, direction: Vector3, onPlane: boolean, name: string): ItemOf<'lineation'> {
    const line = lineOf(tilted(direction, this.noise, this.frame.random))
    const [plunge, trend] = [Math.round(line.plunge), this.azimuth(line.gridTrend, station.at)]
    return {
      kind: 'lineation',
      id: this.frame.id(),
      geometry: this.frame.point(misplaced(station.at, this.noise, this.frame.random)),
      properties: {
        type: onPlane ? 'lineation' : 'minor-fold-axis',
        trend,
        plunge,
        plane: onPlane ? { type: 'cleavage', ...this.measured(station, 'cleavage') } : null,
        station: name,
        reading: {
          text: `${String(trend).padStart(3, '0')}/${String(plunge).padStart(2, '0')}`,
          convention: 'trend-plunge',
          northReference: 'true',
          declination: null,
        },
        note: '',
      },
    }
  }

  /** A thing found at a place; a direction of tops is that in which the beds get younger. */
  find(station: Station, type: StationType, name: string, note: string): ItemOf<'station'> {
    const [east, north] = beddingNormal(this.truth, station)
    const directed = type === 'tops-direction' || type === 'mine-adit'
    return {
      kind: 'station',
      id: this.frame.id(),
      geometry: this.frame.point(station.at),
      properties: {
        type,
        name,
        azimuth: directed ? this.azimuth(toDegrees(Math.atan2(east, north)), station.at) : null,
        note,
      },
    }
  }

  label({ at, shows }: Label, units: readonly ItemOf<'unit'>[]): ItemOf<'unit-label'> {
    const label = unitLabelOf(shows)
    const unit = units.find(({ properties }) => properties.label === label)
    if (!unit) throw new RangeError(`There is no unit ${label}.`)
    return {
      kind: 'unit-label',
      id: this.frame.id(),
      geometry: this.frame.point(at),
      properties: { unit: unit.id, identity: 'certain', note: '' },
    }
  }
}

/** Units whose sedimentary structures show which way is up. */
const topsShown = new Set(['Df', 'Oe', 'Op', 'Mk'])
