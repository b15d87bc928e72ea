// Imported before everything else: in words that an old Node understands too.
const needed = [20, 19]
const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
if (major < needed[0] || (major === needed[0] && minor < needed[1])) {
  process.stderr.write(
    `Breakaway needs Node ${needed.join('.')} or later and this is ${process.versions.node}: install a newer Node.\n`,
  )
  process.exit(1)
}
