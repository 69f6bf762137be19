#include "fieldtest/student.hpp"

#include <boost/math/distributions/students_t.hpp>

namespace rainledger {

double student_95(std::size_t degrees_of_freedom) {
    constexpr double kAbove = 0.025;
    const boost::math::students_t_distribution<double> student(
        static_cast<double>(degrees_of_freedom));
    return boost::math::quantile(boost::math::complement(student, kAbove));
}

}  // namespace rainledger
