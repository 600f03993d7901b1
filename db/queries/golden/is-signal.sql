select `s`.`id`
from (select * from signals where branch_id in (select value from json_each(?))) as `s`
where (? = 1 or s.behind is null or (select count(*) from json_each(s.behind) as other where other.value not in (select value from json_each(?))) >= ?) and `s`.`id` = ?;
