#include "rainledger/reference/names.hpp"

#include <array>

#include "test.hpp"

namespace rainledger {
namespace {

struct Named {
    std::string_view name;
    int value;
};

constexpr std::array<Named, 3> kRows{{{"flat roofs", 1}, {"sloped roofs", 2}, {"flat roofs", 3}}};

}  // namespace

TEST_CASE("names agree whatever their case, blanks and punctuation") {
    for (const char* typed :
         {"sandy loam", "Sandy Loam", "sandy-loam", "sandy_loam", "SANDYLOAM", "  sandy   loam "})
        CHECK(same_name(typed, "sandy loam"));
    CHECK(same_name("desert, natural", "desert natural"));
    CHECK_FALSE(same_name("sandy", "sandy loam"));
    CHECK_FALSE(same_name("loamy sand", "sandy loam"));
}

TEST_CASE("a fraction is part of a name") {
    CHECK(same_name("Lots of 1/4 acre", "lots-of-1/4-acre"));
    CHECK_FALSE(same_name("lots of 14 acre", "lots of 1/4 acre"));
}

TEST_CASE("a name without letters is no name") {
    CHECK_FALSE(same_name("", ""));
    CHECK_FALSE(same_name("--", " _ "));
    CHECK_FALSE(mentions("flat roofs", " - "));
    CHECK_FALSE(same_name("sand\xC3\xA9", "sand"));
}

TEST_CASE("rows are found by name and by part of a name") {
    const std::span<const Named> rows = kRows;
    const auto flat = rows_named(rows, "Flat_Roofs");
    REQUIRE(flat.size() == 2);
    CHECK(flat[0]->value == 1);
    CHECK(flat[1]->value == 3);
    CHECK(rows_named(rows, "roofs").empty());
    CHECK(rows_mentioning(rows, "ROOF").size() == 3);
    CHECK(rows_mentioning(rows, "sloped roof").size() == 1);
    CHECK(names_of(rows) == std::vector<std::string_view>{"flat roofs", "sloped roofs"});
}

}  // namespace rainledger
