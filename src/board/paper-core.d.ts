/** The drawing library without its script language: its own types serve, under the name of the file that holds less. */
declare module 'paper/dist/paper-core.js' {
  import paperFull from 'paper'
  export default paperFull
}
