import { reactRouter } from "@react-router/dev/vite";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "vite";

export default defineConfig({
  plugins: [tailwindcss(), process.env.VITEST ? null : reactRouter()],
  resolve: { tsconfigPaths: true },
  // Inlined fonts become data: addresses, which the content policy refuses.
  build: { assetsInlineLimit: 0 },
  server: { host: "127.0.0.1" },
});
