import { runTask, type CalcAnswer, type CalcMessage } from "./calc-tasks";

self.addEventListener("message", (event: MessageEvent<CalcMessage>) => {
  const { id, name, input } = event.data;
  let answer: CalcAnswer;
  try {
    answer = { id, output: runTask(name, input) };
  } catch (error) {
    answer = { id, error: error instanceof Error ? error.message : "The calculation failed." };
  }
  self.postMessage(answer);
});
