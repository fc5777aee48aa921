/** Where a device keeps the theme its user chose. The bench has its own choice, and starts on the stage theme. */
export const themeKeys = { desk: 'hoopwright-theme', bench: 'hoopwright-bench-theme' } as const

/** Sets the chosen theme before the first paint, so that a dark room is not lit up by a white flash. */
export const themeScript = `(function(){var b=location.pathname.indexOf('/b/')===0,t=null;try{t=localStorage.getItem(b?'${themeKeys.bench}':'${themeKeys.desk}')}catch(e){}if(!t&&b)t='stage';if(t==='paper'||t==='stage')document.documentElement.dataset.theme=t})()`
