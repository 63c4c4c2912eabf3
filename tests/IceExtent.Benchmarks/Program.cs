using BenchmarkDotNet.Running;
using IceExtent.Benchmarks;

// "inflate" is a whole-job yardstick for scripts/bench.sh; everything else is a micro-benchmark.
return args is ["inflate", ..] ? InflateOnly.Run(args[1..]) : Micro(args);

static int Micro(string[] args)
{
    BenchmarkSwitcher.FromAssembly(typeof(InflateOnly).Assembly).Run(args);
    return 0;
}
