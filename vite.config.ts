import { reactRouter } from "@react-router/dev/vite";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "vite";

export default defineConfig({
  plugins: [tailwindcss(), reactRouter()],
  resolve: { tsconfigPaths: true },
  environments: {
    // The server's way in opens the database before it answers; the framework's own build is imported by it.
    ssr: { build: { rollupOptions: { input: "./app/server.ts" } } },
  },
});
