import { createPinia } from 'pinia'
import { createApp } from 'vue'
import '@fontsource/work-sans/latin-400.css'
import '@fontsource/work-sans/latin-500.css'
import '@fontsource/work-sans/latin-600.css'
import 'quasar/src/css/index.sass'
import './css/app.sass'
import App from './App.vue'
import { useQuasar } from './boot/quasar'
import { useServerData } from './boot/server-data'
import { makeRouter } from './router'

const app = createApp(App)
app.use(createPinia())
const router = makeRouter()
useQuasar(app)
useServerData(app, router)
app.use(router)
app.mount('#app')
