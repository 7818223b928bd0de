// An empty module: lets worker, commands and tests import what Next keeps out of the browser.
export {};
