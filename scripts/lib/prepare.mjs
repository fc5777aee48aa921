import { installPackages } from './packages.mjs'
import { openCluster } from './postgres-cluster.mjs'
import { clusterHome } from './postgres-home.mjs'
import { findPostgres } from './postgres-programs.mjs'
import { keepSecrets } from './secrets.mjs'

/** The packages, as locked. */
export const preparePackages = ({ steps, place, processes }) =>
  steps.step('Packages', (say) => installPackages({ place, processes, say }))

export const prepareSecrets = ({ steps, place }) =>
  steps.step('Secrets', (say) => {
    const { secrets, made } = keepSecrets(place.secretsFile)
    say(made > 0 ? 'made' : 'kept')
    return secrets
  })

/** The programs of PostgreSQL, installed if need be. */
export const preparePostgres = ({ steps, place, processes }) =>
  steps.step('PostgreSQL', (say) => findPostgres({ place, processes, say }))

/** This run's own database server with its database. */
export const prepareCluster = ({ steps, place, processes, tell }, { programs, secrets, throwaway }) =>
  steps.step('Database server', (say) =>
    openCluster({ home: clusterHome(place), programs, processes, password: secrets.databasePassword, throwaway, say, tell }),
  )
