#include <cstdlib>

#include <signal.h>
#include <sys/stat.h>

#include "cli/runner.hpp"
#include "cli/scenarios.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Names = std::vector<std::string>;

const Names kInputs{"rain.csv", "yard.yaml"};

}  // namespace

TEST_CASE("a file that cannot be read is status 4, beside a wrong input 3") {
    const Folder folder;
    const Outcome missing = run({folder.path()}, {"losses", "none.yaml"});
    CHECK(missing.status == 4);
    CHECK_THAT(missing.err, Contains("none.yaml: error: "));
    CHECK(missing.err.ends_with("rainledger: 1 error in none.yaml; nothing was computed\n"));

    folder.write("yard.yaml", kYard);
    const Outcome no_rain = run({folder.path()}, {"losses", "yard.yaml"});
    CHECK(no_rain.status == 4);
    CHECK_THAT(no_rain.err, Contains("yard.yaml:3:15: error: cannot read 'rain.csv': "));

    folder.write("yard.yaml", kYard + "    depth: 1 mm\n");
    const Outcome both = run({folder.path()}, {"losses", "yard.yaml"});
    CHECK(both.status == 3);
    CHECK(both.err.ends_with("rainledger: 2 errors in yard.yaml; nothing was computed\n"));

    folder.write("rain.csv", "end [min],depth [mm]\n10,two\n");
    const Outcome apart = run({folder.path()}, {"losses", "yard.yaml"});
    CHECK(apart.status == 3);
    CHECK_THAT(apart.err, Contains("rain.csv:2:4: error: "));
    CHECK(apart.err.ends_with("rainledger: 2 errors; nothing was computed\n"));
}

TEST_CASE("an output that cannot be opened is status 4 before anything is computed") {
    const Yard yard;
    const Outcome outcome = run(yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv", "--json",
                                               "no/such/folder/x.json"});
    CHECK(outcome.status == 4);
    CHECK(outcome.out.empty());
    CHECK(outcome.err ==
          "rainledger: cannot write no/such/folder/x.json: No such file or directory\n");
    CHECK(yard.folder.names() == kInputs);
}

TEST_CASE("a full disk is status 4 and leaves nothing behind") {
    Yard yard;
    const Outcome file =
        run(yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv", "--json", "/dev/full"});
    CHECK(file.status == 4);
    CHECK(file.out.empty());
    CHECK(file.err == "rainledger: cannot write /dev/full: No space left on device\n");
    CHECK(yard.folder.names() == kInputs);

    yard.setting.out = Out::full_disk;
    const Outcome out = run(yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv"});
    CHECK(out.status == 4);
    CHECK(out.err == "rainledger: cannot write standard output: No space left on device\n");
    CHECK(yard.folder.names() == kInputs);

    const Outcome help = run(yard.setting, {"--help"});
    CHECK(help.status == 4);
    CHECK(help.err == "rainledger: cannot write standard output: No space left on device\n");
}

TEST_CASE("a reader of standard output that went away ends the program quietly") {
    Yard yard;
    yard.setting.out = Out::closed_pipe;
    const Outcome outcome = run(yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv"});
    CHECK(outcome.status == 0);
    CHECK(outcome.err.empty());
    CHECK(yard.folder.read("l.csv").starts_with("storm,drains_to,surface,"));
    CHECK(run(yard.setting, {"schema"}).status == 0);
}

TEST_CASE("a standard output closed from the start loses the results, which is told") {
    Yard yard;
    yard.setting.out = Out::closed;
    const Outcome outcome = run(yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv"});
    CHECK(outcome.status == 4);
    CHECK(outcome.err == "rainledger: cannot write standard output: Bad file descriptor\n");
    CHECK(yard.folder.names() == kInputs);
}

TEST_CASE("two outputs into one stream are written once each, one after the other") {
    const Yard yard;
    // A pipe: the runner's own capture is a file, which two outputs may not share.
    const std::string command = "cd '" + yard.folder.path() +
                                "' && { '" RAINLEDGER_PROGRAM
                                "' losses yard.yaml --quiet --ledger /dev/stderr --json /dev/stderr"
                                " 2>&1 >/dev/null; } | cat >both";
    REQUIRE(std::system(command.c_str()) == 0);
    const std::string both = yard.folder.read("both");
    const std::string header = "storm,drains_to,surface,";
    const std::size_t json = both.find("\n{\n");
    CHECK(both.starts_with(header));
    CHECK(both.find(header, 1) == std::string::npos);
    REQUIRE(json != std::string::npos);
    CHECK(both.find("\n{\n", json + 1) == std::string::npos);
}

TEST_CASE("an interrupt removes the temporary files and ends with 130") {
    const Yard yard;
    // A pipe that nobody reads holds the program up while the ledger's file is open.
    REQUIRE(::mkfifo(yard.folder.path("pipe").c_str(), 0600) == 0);
    for (const int signal : {SIGINT, SIGTERM}) {
        const Outcome outcome = run_and_signal(
            yard.setting, {"losses", "yard.yaml", "--ledger", "l.csv", "--json", "pipe"},
            "l.csv.part-", signal);
        CHECK(outcome.status == 130);
        CHECK(outcome.out.empty());
        CHECK(outcome.err.empty());
        CHECK(yard.folder.names() == Names{"pipe", "rain.csv", "yard.yaml"});
    }
}

TEST_CASE("colour stands on a terminal alone, and NO_COLOR or a dumb terminal has none") {
    const Folder folder;
    folder.write("s.yaml", kWarning);
    const auto errors_of = [&](bool terminal, std::string name, std::string value) {
        return run({folder.path(), Out::captured, terminal, {{name, value}}}, {"losses", "s.yaml"})
            .err;
    };
    const std::string coloured = "s.yaml:6:14: \x1b[33mwarning\x1b[0m: surface 'yard'";
    const std::string plain = "s.yaml:6:14: warning: surface 'yard'";
    CHECK_THAT(errors_of(true, "NO_COLOR", ""), Contains(coloured));
    CHECK_THAT(errors_of(true, "NO_COLOR", "1"), Contains(plain));
    CHECK_THAT(errors_of(true, "TERM", "dumb"), Contains(plain));
    CHECK_THAT(errors_of(false, "TERM", "xterm"), Contains(plain));
}

}  // namespace rainledger::cli_test
