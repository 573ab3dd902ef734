// On a public page the words and the picture come first: the app is fetched when they are there, in its own order.
(function () {
  var sources = document.currentScript.dataset.sources.split(' ');
  function fetchApp() {
    sources.forEach(function (source) {
      var script = document.createElement('script');
      script.src = source;
      script.async = false;
      document.body.appendChild(script);
    });
  }
  if (document.readyState === 'complete') fetchApp();
  else addEventListener('load', fetchApp);
})();
