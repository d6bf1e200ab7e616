/** The caution that the app, each printed sheet and each download carry. */
export const CAUTION =
  'A geologic map is an interpretation at a stated scale. It is not for site-specific engineering, hazard or resource decisions without investigation by a licensed practitioner under the local rules.'
