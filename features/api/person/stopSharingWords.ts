/** What is asked, wherever sharing with teachers would end and recordings be deleted. */
export const stopSharingWords = {
  question: "Stop sharing?",
  failed: "Nothing was changed.",
  confirmLabel: "Stop and delete them",
  keepLabel: "Go on sharing",
};
