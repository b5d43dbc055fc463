/** What the commands that look after the database file need, in one import. */
export { filePath, requireEnvironment } from './env'
export { migrate } from './migrate'
export { readMigrationSet } from './migration-files'
