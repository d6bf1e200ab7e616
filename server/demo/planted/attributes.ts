import { copyOf, middleOf, type Planter } from './bench'

/** One planter for each rule about what items say. Dips beyond 90° and azimuths beyond 360° never reach a sheet: its
 *  schema refuses them; the field files hold some. */
export const attributePlanters = {
  'reading-contradicts-itself': (bench) => {
    const attitude = bench.pick('attitude', ({ properties: { dip } }) => dip > 20 && dip < 70)
    const reading = {
      text: 'N45E 40NE',
      convention: 'quadrant' as const,
      northReference: 'true' as const,
      declination: null,
    }
    bench.put({ ...attitude, properties: { ...attitude.properties, reading } })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'a reading whose dip letter lies along its strike',
    }
  },
  'overturned-without-dip': (bench) => {
    const attitude = bench.pick('attitude', ({ properties }) => properties.dip === 0)
    bench.put({ ...attitude, properties: { ...attitude.properties, overturned: true } })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'a level bed that is called overturned',
    }
  },
  'magnetic-without-declination': (bench) => {
    const attitude = bench.pick('attitude', ({ properties }) => properties.reading !== null)
    const { reading } = attitude.properties
    bench.put({
      ...attitude,
      properties: {
        ...attitude.properties,
        reading: reading && { ...reading, northReference: 'magnetic', declination: null },
      },
    })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'a magnetic reading without a declination',
    }
  },
  'concealed-without-cover': (bench) => {
    const trace = bench.pick('axial-trace', ({ properties }) => properties.locationConfidence === 'certain')
    bench.put({ ...trace, properties: { ...trace.properties, locationConfidence: 'concealed' } })
    return {
      items: [trace.id],
      at: middleOf(trace.geometry.coordinates),
      what: 'a trace on bare rock that is called concealed',
    }
  },
  'questioned-without-note': (bench) => {
    const contact = bench.pick(
      'contact',
      ({ properties }) => properties.identity === 'certain' && properties.locationConfidence !== 'concealed',
    )
    bench.put({ ...contact, properties: { ...contact.properties, identity: 'questionable', note: '' } })
    return {
      items: [contact.id],
      at: middleOf(contact.geometry.coordinates),
      what: 'a questioned contact that does not say why',
    }
  },
  'two-readings-at-one-place': (bench) => {
    const attitude = bench.pick(
      'attitude',
      ({ properties: { dip, strike } }) => strike !== null && dip > 20 && dip < 70,
    )
    const other = copyOf(bench, attitude)
    const dip = attitude.properties.dip + (attitude.properties.dip > 45 ? -20 : 20)
    bench.put({ ...other, properties: { ...other.properties, dip, reading: null } })
    bench.keep(attitude)
    return {
      items: [attitude.id, other.id],
      at: attitude.geometry.coordinates,
      what: 'a station with two dips, 20° apart',
    }
  },
} satisfies Record<string, Planter>
