using System.Text;
using CsCheck;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Tests.JobFile;

public class HostileTextTests
{
    private static readonly Gen<byte[]> AnyBytes = Gen.Byte.Array[0, 200];

    private static readonly string[] Tokens =
        ["{", "}", "[", "]", ",", ":", "\"", "null", "true", "1e999", "-", "\"\"", "0", "{}", "[]", "\\", "//", "/*", "\u0000", "\"\\ud800\"", "mm", "±", ".."];

    private static readonly Gen<byte[]> OneTokenFlipped =
        from at in Gen.Int[0, JobFiles.Complete.Length - 1]
        from length in Gen.Int[0, 12]
        from token in Gen.OneOf(Tokens)
        select (byte[])[.. JobFiles.Complete[..at], .. Encoding.UTF8.GetBytes(token), .. JobFiles.Complete[Math.Min(at + length, JobFiles.Complete.Length)..]];

    [Fact]
    public void The_complete_file_cut_at_any_byte_is_faults_and_never_an_exception()
    {
        int last = JobFiles.Complete.AsSpan().LastIndexOf((byte)'}');
        for (int length = 0; length <= last; length++)
        {
            (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(JobFiles.Complete.AsSpan(0, length));

            Assert.Null(job);
            Assert.InRange(Assert.Single(faults).Line, 1, JobFiles.Complete.Count(letter => letter == '\n') + 1);
        }
    }

    [Fact]
    public void Any_bytes_are_a_job_or_faults() => AnyBytes.Sample(bytes => { IsJobOrFaults(bytes); }, iter: 5000);

    [Fact]
    public void A_file_with_one_token_flipped_is_a_job_or_faults() => OneTokenFlipped.Sample(bytes => { IsJobOrFaults(bytes); }, iter: 3000);

    [Fact]
    public void A_file_whose_every_value_in_turn_is_of_another_kind_is_a_job_or_faults()
    {
        string text = JobFiles.Written(JobFiles.Whole(Encoding.UTF8.GetString(JobFiles.Complete)));
        string[] lines = text.Split('\n');
        int faulty = 0;
        foreach (string other in new[] { "null", "true", "1e999", "-1", "\"\"", "\" \"", "[]", "{}", "[null]", "[[1]]", "{ \"a\": { \"a\": 1, \"a\": 2 } }" })
        {
            for (int i = 0; i < lines.Length; i++)
            {
                int colon = lines[i].IndexOf("\": ", StringComparison.Ordinal);
                if (colon > 0 && !lines[i].EndsWith('{') && !lines[i].EndsWith('['))
                {
                    string[] changed = [.. lines];
                    changed[i] = lines[i][..(colon + 3)] + other + (lines[i].EndsWith(',') ? "," : "");
                    faulty += IsJobOrFaults(Encoding.UTF8.GetBytes(string.Join('\n', changed))) ? 0 : 1;
                }
            }
        }

        Assert.InRange(faulty, 1000, int.MaxValue);
    }

    private static bool IsJobOrFaults(byte[] bytes)
    {
        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(bytes);
        Assert.Equal(job is null, faults.Count > 0);
        Assert.All(faults, fault => Assert.True(fault.Line >= 1 && fault.Message.Length > 0));
        Assert.Equal(faults.Select(fault => fault.Line).Order(), faults.Select(fault => fault.Line));
        return job is not null;
    }
}
