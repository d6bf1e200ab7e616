export { isSame } from '@shared/changes/same-value'
