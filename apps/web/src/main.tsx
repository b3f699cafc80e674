import "./app/content-policy.ts";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { RouterProvider } from "react-router/dom";
import { Providers } from "./app/providers.tsx";
import { appRouter } from "./app/router.tsx";
import "./styles/app.css";

const root = document.getElementById("app");
if (root === null) throw new TypeError("index.html: expected an element with the id app");

createRoot(root).render(
  <StrictMode>
    <Providers>
      <RouterProvider router={appRouter()} />
    </Providers>
  </StrictMode>,
);
