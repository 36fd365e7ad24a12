import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/** @type {import('@sveltejs/vite-plugin-svelte').SvelteConfig} */
export default {
  preprocess: vitePreprocess(),
  compilerOptions: {
    // Runes in our own components; packages may be of the older kind.
    runes: ({ filename }) => (/[/\\]node_modules[/\\]/.test(filename) ? undefined : true),
  },
};
