import '@fontsource/ibm-plex-sans/latin-400.css'
import '@fontsource/ibm-plex-sans/latin-500.css'
import '@fontsource/ibm-plex-sans/latin-600.css'
import '@fontsource/ibm-plex-sans/latin-700.css'
import '@fontsource/ibm-plex-sans/latin-ext-400.css'
import '@fontsource/ibm-plex-sans/latin-ext-500.css'
import '@fontsource/ibm-plex-sans/latin-ext-600.css'
import '@fontsource/ibm-plex-sans/latin-ext-700.css'
import './assets/tokens.css'
import './assets/base.css'
import './assets/element-theme.css'
import './assets/print.css'
import { createPinia } from 'pinia'
import { createApp } from 'vue'
import App from './App.vue'
import { createTexts } from './i18n'
import { createAppRouter } from './router'
import { admitToAreas } from './router/admit-to-areas'

const texts = createTexts()
const router = createAppRouter()
admitToAreas(router, texts)

createApp(App).use(createPinia()).use(texts).use(router).mount('#app')
