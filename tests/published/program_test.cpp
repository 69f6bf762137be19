#include <cstddef>
#include <map>
#include <string>

#include "published/check_files.hpp"
#include "published/judge.hpp"
#include "published/program_books.hpp"
#include "test.hpp"

// The storms marked `through_program` once more, through the program and its output files.
namespace rainledger::published {
namespace {

std::size_t run_storms(std::string_view name) {
    const CheckFile file = load(name);
    std::map<std::string, StormBooks> books;
    for (const auto& [storm, stored] : file.storms)
        if (stored.through_program) books.emplace(storm, program_books(stored));
    std::size_t run = 0;
    for (const Check& check : file.checks) {
        const auto kept = books.find(check.computation.storm);
        if (kept == books.end()) continue;
        INFO(check.id);
        CHECK(judge(file, check, [&](const StoredStorm& /*storm*/) {
                  return kept->second;
              }).problems == "");
        ++run;
    }
    return run;
}

}  // namespace

TEST_CASE("the program reproduces the sandy loam storm") {
    CHECK(run_storms("green_ampt_storms.yaml") == 12);
}

TEST_CASE("the program reproduces the Horton storms") {
    CHECK(run_storms("horton_storms.yaml") == 9);
}

TEST_CASE("the program reproduces the phi index storm") {
    CHECK(run_storms("constant_rates.yaml") == 4);
}

TEST_CASE("the program reproduces the curve number storm") {
    CHECK(run_storms("curve_number.yaml") == 6);
}

}  // namespace rainledger::published
