// Stands in for the server socket of another test runner, which @open-wc/testing imports but never needs here.
export const sendMessage = () => {};
export const sendMessageWaitForResponse = () => Promise.reject(new Error('no such server in these tests'));
