/* Runs before anything is drawn, so that a stored choice of ground does not flash the other one first. */
;(function () {
  try {
    var choice = localStorage.getItem('bicinium.ground')
    if (choice === 'light' || choice === 'dark') document.documentElement.dataset.ground = choice
  } catch {
    /* Storage refused: the system's choice stands. */
  }
})()
