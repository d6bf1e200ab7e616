import { z } from 'zod'
import { nothing } from './common'
import { endpoint } from './endpoint'

export const getSpecimen = endpoint({
  id: 'getSpecimen',
  room: 'symbols',
  method: 'get',
  path: '/symbols/specimen.pdf',
  summary: 'The whole symbol set as a PDF: at 100 % and 400 %, in colour and in one ink',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: z.any(),
  form: 'download',
  problems: [],
})
