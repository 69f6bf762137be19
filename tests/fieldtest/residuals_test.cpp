#include "fieldtest/residuals.hpp"

#include <cmath>

#include "fieldtest/tests_of.hpp"

namespace rainledger {

TEST_CASE("neighbouring residuals are compared within each test") {
    const std::vector<InfiltrationTest> tests{
        test_of(ReadingKind::infiltrated, {10, 20, 30}, {2.0, 3.0, 4.0}, "P1"),
        test_of(ReadingKind::infiltrated, {10, 20}, {5.0, 6.0}, "P2")};
    const auto spans = depth_spans(tests);
    REQUIRE(spans.size() == 5);
    // Residuals 1, 2, -1 and 3, 1: products 2 - 2 and 3, squares 16; none across the tests.
    const auto found = lag_one_correlation(tests, spans, std::vector{1.0, 1.0, 5.0, 2.0, 5.0});
    REQUIRE(found);
    CHECK_THAT(*found, WithinRel(3.0 / 16.0, 1.0e-12));
    CHECK_FALSE(lag_one_correlation(tests, spans, std::vector{2.0, 3.0, 4.0, 5.0, 6.0}));
}

TEST_CASE("what is fitted follows the kind of reading") {
    const std::vector<InfiltrationTest> drops{test_of(ReadingKind::drop, {10, 30}, {2.0, 3.0})};
    const auto intervals = depth_spans(drops);
    CHECK(intervals[1].from_h == drops[0].readings[1].start_h);
    CHECK(intervals[1].depth_mm == 3.0);
    const std::vector<InfiltrationTest> depths{
        test_of(ReadingKind::infiltrated, {10, 30}, {2.0, 5.0})};
    CHECK(depth_spans(depths)[1].from_h == 0.0);
    CHECK(depth_spans(depths)[1].depth_mm == 5.0);
}

TEST_CASE("an exact fit has a finite criterion, and few readings none") {
    // Six readings, two parameters and the variance: q = 3, 2 q + 2 q (q + 1)/(n - q - 1) = 18.
    CHECK_THAT(*corrected_akaike(12.0, 50.0, 6, 2), WithinRel(6.0 * std::log(2.0) + 18.0, 1.0e-12));
    CHECK_THAT(*corrected_akaike(0.0, 50.0, 6, 2),
               WithinRel(6.0 * std::log(2.5e-15) + 18.0, 1.0e-12));
    CHECK_FALSE(corrected_akaike(12.0, 50.0, 4, 2));
    CHECK(corrected_akaike(12.0, 50.0, 5, 2));
}

}  // namespace rainledger
