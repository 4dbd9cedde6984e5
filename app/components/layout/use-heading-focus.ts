import { useEffect, useRef } from "react";
import { useLocation } from "react-router";

/** After a navigation within the page the focus goes to the new heading, so that those who hear the page know where they are. */
export function useHeadingFocus(): void {
  const { pathname } = useLocation();
  const lastPathname = useRef(pathname);
  useEffect(() => {
    if (lastPathname.current === pathname) return;
    lastPathname.current = pathname;
    const main = document.getElementById("main");
    if (!main || main.contains(document.activeElement)) return;
    const heading = main.querySelector<HTMLElement>("h1") ?? main;
    if (!heading.hasAttribute("tabindex")) heading.tabIndex = -1;
    heading.focus({ preventScroll: true });
  }, [pathname]);
}
