const PROJECTS = ['unit', 'reference', 'api', 'e2e']

/** The names of the test projects that a run with these arguments may include; without `--project`, all. */
export function projectsIn(args) {
  const named = args.flatMap((arg, place) => {
    if (arg === '--project') return [args[place + 1] ?? '']
    return arg.startsWith('--project=') ? [arg.slice('--project='.length)] : []
  })
  // A pattern could mean any of them: then everything is made ready.
  return new Set(named.length > 0 && named.every((name) => PROJECTS.includes(name)) ? named : PROJECTS)
}
