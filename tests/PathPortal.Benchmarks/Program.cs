using PathPortal.Benchmarks;

StepBenchmark.Run(Console.Out);
return 0;
