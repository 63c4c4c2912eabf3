using System.ComponentModel;
using System.Diagnostics;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Runs another program that judges our files.</summary>
internal static class ExternalProgram
{
    /// <summary>Gives what it prints; fails the test where it is missing or returns anything but 0.</summary>
    /// <param name="package">The Debian package to install where the program is missing.</param>
    public static string Run(string package, string program, params string[] arguments)
    {
        ProcessStartInfo start = new(program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true };
        try
        {
            using Process process = Process.Start(start)!;
            Task<string> errors = process.StandardError.ReadToEndAsync();
            string output = process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            Assert.True(
                process.ExitCode == 0,
                $"{program} returned {process.ExitCode}; it needs the Debian package {package}. It said: {errors.GetAwaiter().GetResult()}");
            return output;
        }
        catch (Win32Exception)
        {
            Assert.Fail($"{program} is missing: install the Debian package {package}.");
            return string.Empty;
        }
    }
}
