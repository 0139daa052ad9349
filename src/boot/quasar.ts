import { Dialog, Notify, Quasar } from 'quasar'
import iconSet from 'quasar/icon-set/svg-material-icons.js'
import type { App } from 'vue'

/** Quasar without ripples or an icon font: its few icons are drawn as SVG. */
export function useQuasar(app: App): void {
  app.use(Quasar, {
    plugins: { Dialog, Notify },
    iconSet,
    config: { ripple: false, notify: { position: 'bottom-left', timeout: 4000 } },
  })
}
