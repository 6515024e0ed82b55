import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig, passthroughImageService } from 'astro/config';
import auth from 'auth-astro';

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'standalone', experimentalDisableStreaming: true }),
  integrations: [react(), auth({ configFile: './src/auth/authConfig.ts' })],
  image: { service: passthroughImageService() },
  devToolbar: { enabled: false },
  security: {
    // Our own middleware checks the origin of every unsafe request, JSON included.
    checkOrigin: false,
    // src/server sets the forwarded host from APP_URL and drops what the client sent.
    allowedDomains: [{}],
  },
  experimental: {
    csp: {
      directives: [
        "default-src 'self'",
        "img-src 'self' data: blob:",
        "object-src 'none'",
        "base-uri 'none'",
        "frame-ancestors 'none'",
        "form-action 'self'",
      ],
    },
  },
  vite: {
    plugins: [tailwindcss()],
    // A font inside the style sheet would be a data: address, which the policy refuses.
    build: { assetsInlineLimit: 0 },
    ssr: { noExternal: ['echarts-for-react', 'echarts', 'zrender'] },
  },
});
