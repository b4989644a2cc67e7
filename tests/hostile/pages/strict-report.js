// keeps what the page's policy was asked to refuse, for the test to read
window.violations = [];
document.addEventListener('securitypolicyviolation', (event) => {
  window.violations.push(`${event.effectiveDirective}: ${event.blockedURI} ${event.sample} ${event.sourceFile}:${event.lineNumber}`);
});
