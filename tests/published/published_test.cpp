#include <algorithm>
#include <filesystem>
#include <iostream>
#include <set>
#include <string>

#include "published/check_files.hpp"
#include "published/judge.hpp"
#include "published/table.hpp"
#include "test.hpp"

// Every published check through the library. A section carries the id of its check.
namespace rainledger::published {
namespace {

void run_checks(std::string_view name) {
    const CheckFile file = load(name);
    for (const Check& check : file.checks) {
        DYNAMIC_SECTION(check.id) {
            CHECK(judge(file, check, library_books).problems == "");
        }
    }
}

}  // namespace

TEST_CASE("published checks of Green and Ampt") {
    run_checks("green_ampt.yaml");
}

TEST_CASE("published checks of storms after Green and Ampt") {
    run_checks("green_ampt_storms.yaml");
}

TEST_CASE("published checks of Green and Ampt without dimensions") {
    run_checks("green_ampt_ratios.yaml");
}

TEST_CASE("published checks of Horton") {
    run_checks("horton.yaml");
}

TEST_CASE("published checks of storms after Horton") {
    run_checks("horton_storms.yaml");
}

TEST_CASE("published checks of Philip") {
    run_checks("philip.yaml");
}

TEST_CASE("published checks of constant rates and the phi index") {
    run_checks("constant_rates.yaml");
}

TEST_CASE("published checks of the curve number") {
    run_checks("curve_number.yaml");
}

TEST_CASE("published checks of the runoff table") {
    run_checks("runoff_table.yaml");
}

TEST_CASE("published checks of the initial abstraction ratio") {
    run_checks("abstraction_ratio.yaml");
}

TEST_CASE("published checks of antecedent conditions") {
    run_checks("antecedent.yaml");
}

TEST_CASE("published checks of rainfall statistics") {
    run_checks("rainfall_statistics.yaml");
}

TEST_CASE("published checks of design storms") {
    run_checks("design_storms.yaml");
}

TEST_CASE("published checks of soil tables") {
    run_checks("soil_tables.yaml");
}

TEST_CASE("published checks of pedotransfer regressions") {
    run_checks("pedotransfer.yaml");
}

TEST_CASE("published checks of cover numbers") {
    run_checks("cover_numbers.yaml");
}

TEST_CASE("published checks of soil groups") {
    run_checks("soil_groups.yaml");
}

TEST_CASE("published checks of Horton's values") {
    run_checks("horton_values.yaml");
}

TEST_CASE("published checks of storage and steady rates") {
    run_checks("storage_values.yaml");
}

TEST_CASE("published checks of field tests") {
    run_checks("field_tests.yaml");
}

TEST_CASE("no published check vanishes") {
    for (const ListedFile& listed : kListedFiles) {
        const CheckFile file = load(listed.name);
        INFO(listed.name);
        CHECK(file.checks.size() == listed.checks);
        CHECK(value_count(file) == listed.values);
    }
}

TEST_CASE("every file of checks is run") {
    std::set<std::string> in_folder;
    for (const auto& entry : std::filesystem::directory_iterator(kPublishedFolder))
        if (entry.path().extension() == ".yaml") in_folder.insert(entry.path().filename().string());
    std::set<std::string> listed;
    for (const ListedFile& file : kListedFiles)
        listed.emplace(file.name);
    CHECK(in_folder == listed);
}

TEST_CASE("ids of checks are unique over all files") {
    std::set<std::string> ids;
    for (const ListedFile& listed : kListedFiles)
        for (const Check& check : load(listed.name).checks) {
            INFO(check.id);
            CHECK(ids.insert(check.id).second);
        }
}

TEST_CASE("every source of a check has an entry among the references") {
    const std::string references = file_text(std::string(kDocumentFolder) + "references.md");
    for (const ListedFile& listed : kListedFiles)
        for (const auto& [key, text] : load(listed.name).sources)
            CHECK_THAT(references, Contains("**" + key + "**"));
}

TEST_CASE("the validation document holds the tables as they come out") {
    const std::string document = file_text(std::string(kDocumentFolder) + "validation.md");
    for (const ListedFile& listed : kListedFiles) {
        INFO("regenerate with: test_published \"[.table]\"");
        CHECK(document.find(table_of(load(listed.name))) != std::string::npos);
    }
    CHECK(document.find(summary_of_all()) != std::string::npos);
}

TEST_CASE("prints the tables of the validation document", "[.table]") {
    std::cout << summary_of_all();
    for (const ListedFile& listed : kListedFiles)
        std::cout << '\n' << table_of(load(listed.name));
}

}  // namespace rainledger::published
