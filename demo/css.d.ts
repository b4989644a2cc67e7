// Style sheets that a page imports through Vite.
declare module '*.css';
