#include "cli/losses_options.hpp"
#include "cli/scenarios.hpp"
#include "cli/storm_inputs.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Catch::Matchers::EndsWith;
using Catch::Matchers::StartsWith;

using Names = std::vector<std::string>;

const std::string kTwoSurfaces =
    kTwoStorms +
    "surfaces:\n"
    "  yard: {area: 1000 m2, losses: impervious}\n"
    "  lawn: {area: 1000 m2, losses: {constant_rate: {rate: 20 mm/h}}}\n";

std::string problem_of(const std::vector<std::string>& words) {
    std::string problem;
    const auto options = read_losses_options(words, problem);
    CHECK(options.has_value() == problem.empty());
    return problem;
}

Outcome without_gnuplot(const Folder& folder, const std::vector<std::string>& words) {
    return run({folder.path(), Out::captured, false, {{"PATH", "/nowhere"}}}, words);
}

}  // namespace

TEST_CASE("a chart that cannot be is refused with the command line") {
    CHECK(problem_of({"a", "--chart", "x.gif"}) ==
          "--chart: the ending of 'x.gif' is none of .svg, .png, .pdf and .txt; '-' draws text on "
          "standard output");
    CHECK(problem_of({"a", "--chart", "-", "--json", "-"}) ==
          "--json and --chart cannot both go to standard output; name a file for one of them");
    CHECK(problem_of({"a", "--ledger", "x.svg", "--chart", "./x.svg"}) ==
          "--ledger and --chart name the same file './x.svg'");
    CHECK(problem_of({"a", "--storm", "x"}) == "--storm says what a chart shows; add --chart FILE");
    CHECK(problem_of({"a", "--surface", "x"}) ==
          "--surface says what a chart shows; add --chart FILE");
}

TEST_CASE("losses draws a chart of what was chosen") {
    const Folder folder;
    folder.write("s.yaml", kTwoSurfaces);
    const Outcome outcome =
        run({folder.path()}, {"losses", "s.yaml", "--quiet", "--storm", "long", "--surface", "lawn",
                              "--chart", "lawn.svg", "--json", "s.json"});
    INFO(outcome.err);
    CHECK(outcome.status == 0);
    CHECK(outcome.out.starts_with("Quarry Row\n"));
    CHECK_THAT(folder.read("lawn.svg"), Contains("<svg") && Contains("lawn"));
    CHECK(folder.names() == Names{"lawn.svg", "s.json", "s.yaml"});
    const Outcome whole =
        run({folder.path()}, {"losses", "s.yaml", "--quiet", "--chart", "whole.svg"});
    CHECK(whole.status == 0);
    CHECK(folder.read("whole.svg") != folder.read("lawn.svg"));
}

TEST_CASE("a chart as text stands after the summary") {
    const Yard yard;
    const Outcome plain = run(yard.setting, {"losses", "yard.yaml"});
    const Outcome drawn = run(yard.setting, {"losses", "yard.yaml", "--chart", "-"});
    CHECK(drawn.status == 0);
    CHECK(drawn.out.size() > plain.out.size() + 200);
    CHECK(drawn.out.starts_with(plain.out + "\n"));

    const RainFolder rain;
    const Outcome storm = rain.storm({"rain.csv", "--chart", "-"});
    CHECK(storm.status == 0);
    CHECK(storm.out.starts_with(rain.storm({"rain.csv"}).out + "\n"));
    const Outcome saved = rain.storm({"rain.csv", "--chart", "rain.txt"});
    CHECK(saved.status == 0);
    CHECK(rain.folder.read("rain.txt") == storm.out.substr(saved.out.size() + 1));
}

TEST_CASE("storm draws one storm or several") {
    const RainFolder rain;
    const Outcome outcome = rain.storm({"two.yaml", "--chart", "both.png", "--csv", "x.csv"});
    CHECK(outcome.status == 2);
    CHECK(rain.storm({"two.yaml", "--chart", "both.svg"}).status == 0);
    CHECK_THAT(rain.folder.read("both.svg"), Contains("short") && Contains("long"));
    CHECK(rain.storm({"two.yaml", "--storm", "long", "--chart", "one.svg"}).status == 0);
    CHECK_THAT(rain.folder.read("one.svg"), !Contains("short"));
    CHECK(rain.storm({"county.csv", "--chart", "x.svg"}).err ==
          "rainledger storm: --chart needs a storm; make one of the table with --duration and "
          "--every\nSee 'rainledger storm --help'.\n");
}

TEST_CASE("more storms or surfaces than a chart holds are wrong usage") {
    const Folder folder;
    std::string storms = "storms:\n";
    std::string surfaces = "surfaces:\n";
    for (char name = 'a'; name <= 'm'; ++name) {
        storms +=
            std::string("  ") + name + ": {steps: {every: 5 min, depths: [2, 6], unit: mm}}\n";
        surfaces += std::string("  ") + name + ": {area: 1 ha, losses: impervious}\n";
    }
    folder.write("s.yaml", storms + surfaces);
    const auto complaint = [&](const std::vector<std::string>& words) {
        const Outcome outcome = run({folder.path()}, words);
        CHECK(outcome.status == 2);
        CHECK(outcome.out.empty());
        CHECK(folder.names() == Names{"s.yaml"});
        return outcome.err;
    };
    CHECK(complaint({"storm", "s.yaml", "--quiet", "--chart", "x.svg", "--json", "x.json"}) ==
          "rainledger storm: --chart: a chart holds 12 panels at most, and there are 13 storms; "
          "choose one of them for its own chart\nSee 'rainledger storm --help'.\n");
    CHECK(complaint({"losses", "s.yaml", "--quiet", "--chart", "-", "--ledger", "l.csv"}) ==
          "rainledger losses: --chart: a chart holds 12 panels at most, and there are 13 storms; "
          "choose one of them for its own chart\nSee 'rainledger losses --help'.\n");
    CHECK(complaint({"losses", "s.yaml", "--quiet", "--storm", "a", "--chart", "x.pdf"}) ==
          "rainledger losses: --chart: a chart holds 12 panels at most, and there are 13 surfaces; "
          "choose one of them for its own chart\nSee 'rainledger losses --help'.\n");
    CHECK(run({folder.path()},
              {"losses", "s.yaml", "--quiet", "--storm", "a", "--surface", "m", "--chart", "x.txt"})
              .status == 0);
}

TEST_CASE("a name that is not there is told, and the names that are") {
    const Folder folder;
    folder.write("s.yaml", kTwoSurfaces);
    const auto complaint = [&](const std::string& option, const std::string& name) {
        const Outcome outcome =
            run({folder.path()}, {"losses", "s.yaml", "--quiet", option, name, "--chart", "x.svg"});
        CHECK(outcome.status == 2);
        CHECK(folder.names() == Names{"s.yaml"});
        return outcome.err;
    };
    CHECK(complaint("--surface", "lawns") ==
          "rainledger losses: --surface: 'lawns' is not known; did you mean 'lawn'?\n"
          "See 'rainledger losses --help'.\n");
    CHECK(complaint("--storm", "2031") ==
          "rainledger losses: --storm: '2031' is not known; known here: short, long\n"
          "See 'rainledger losses --help'.\n");
}

TEST_CASE("without gnuplot the chart is told as missing and nothing is written") {
    const Yard yard;
    const Outcome losses = without_gnuplot(
        yard.folder, {"losses", "yard.yaml", "--chart", "x.svg", "--ledger", "l.csv"});
    CHECK(losses.status == 4);
    CHECK(losses.out.empty());
    CHECK_THAT(losses.err, StartsWith("rainledger: cannot draw the chart: ") &&
                               EndsWith("; nothing was written\n"));
    CHECK(yard.folder.names() == Names{"rain.csv", "yard.yaml"});

    const RainFolder rain;
    const Names before = rain.folder.names();
    const Outcome storm =
        without_gnuplot(rain.folder, {"storm", "rain.csv", "--chart", "x.svg", "--csv", "x.csv"});
    CHECK(storm.status == 4);
    CHECK(rain.folder.names() == before);
    CHECK(without_gnuplot(rain.folder, {"storm", "rain.csv", "--csv", "x.csv"}).status == 0);
}

}  // namespace rainledger::cli_test
